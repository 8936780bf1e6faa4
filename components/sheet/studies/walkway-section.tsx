'use client';

import { useMemo } from 'react';
import { useBoardSettings } from '@/components/sheet/editor/board-context';
import { useUnits } from '@/lib/client/use-units';
import { robotSizes } from '@/lib/layout/robot-sticks';
import { walkwayRows } from '@/lib/layout/protective/walkway-check';
import { Cautions } from './cautions';
import { Quiet, Section } from './section';
import { useStudySubjects } from './use-study-subjects';

const RANKS = {
  below: 'below the least width',
  least: 'wide enough, not better',
  better: 'as wide as better',
} as const;

/** Walkways against the widths of the standard, and what stands in them. */
export function WalkwaySection() {
  const { items, robots } = useStudySubjects();
  const { distances } = useBoardSettings();
  const { unit, figure } = useUnits();
  const rows = useMemo(() => {
    const reachMm = robots.reduce((most, { arm }) => Math.max(most, arm.reachMm), 0);
    return walkwayRows(items, distances, robotSizes(reachMm).baseRadiusMm);
  }, [items, robots, distances]);
  return (
    <Section title="Walkways">
      {rows.length === 0 ? (
        <Quiet>No walkway is drawn.</Quiet>
      ) : (
        <ul className="text-sm">
          {rows.map(({ walkwayId, name, widthMm, rank, inTheWay }) => (
            <li key={walkwayId} className="border-t border-hair py-0.5">
              <span className="flex justify-between gap-3">
                <span className="min-w-0">{name}</span>
                <span className="font-mono whitespace-nowrap">
                  {figure(widthMm)} {unit}
                </span>
              </span>
              <span className={rank === 'below' ? 'text-red' : 'text-ink-soft'}>{RANKS[rank]}</span>
              {inTheWay.length > 0 && (
                <span className="block text-red">In it: {inTheWay.map((item) => item.name).join(', ')}.</span>
              )}
            </li>
          ))}
        </ul>
      )}
      <Quiet>
        At least {figure(distances.walkwayLeastMm)}, better {figure(distances.walkwayBetterMm)} {unit}: ISO
        14122-2:2016, from secondary sources and memory. A walkway of less can still be asked for by a local code for
        more.
      </Quiet>
      <Cautions />
    </Section>
  );
}
