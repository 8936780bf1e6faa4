'use client';

import { useMemo } from 'react';
import { useBoardSettings } from '@/components/sheet/editor/board-context';
import { classNames } from '@/components/ui/class-names';
import { useUnits } from '@/lib/client/use-units';
import { gapRows, gapWords } from '@/lib/layout/protective/gap-rows';
import { Cautions } from './cautions';
import { Quiet, Section } from './section';
import { useSpaces } from './use-spaces';
import { useStudySubjects } from './use-study-subjects';

/** Fixed things so near to a robot's space that somebody between them could be crushed. */
export function GapSection() {
  const { items } = useStudySubjects();
  const { robots } = useSpaces();
  const { distances } = useBoardSettings();
  const { unit, figure } = useUnits();
  const rows = useMemo(
    () =>
      robots.flatMap(({ robot, spaces }) => {
        const space = spaces.find(({ kind }) => kind === 'operating');
        if (!space) return [];
        return gapRows(items, space, distances).map((row) => ({ ...row, robotName: robot.name }));
      }),
    [robots, items, distances],
  );
  if (robots.length === 0) return null;
  return (
    <Section title="Gaps to fixed things">
      {rows.length === 0 ? (
        <Quiet>
          Nothing fixed stands nearer to an operating space than {figure(distances.bodyMm)} {unit}, the gap of a body.
        </Quiet>
      ) : (
        <ul className="text-sm">
          {rows.map((row) => (
            <li key={`${row.robotName} ${row.itemId}`} className="flex justify-between gap-3 border-t border-hair">
              <span className="min-w-0">
                {row.robotName} and {row.name}
                <span className="block text-[0.8125rem] text-ink-soft">
                  {row.gapMm === 0 ? 'the operating space reaches it' : gapWords(row)}
                </span>
              </span>
              <span className={classNames('font-mono whitespace-nowrap', row.gapMm === 0 && 'text-red')}>
                {figure(Math.floor(row.gapMm))} {unit}
              </span>
            </li>
          ))}
        </ul>
      )}
      <Quiet>
        Against ISO 13854, in plan and without regard to heights. The operating space holds the moves from task point to
        task point only.
      </Quiet>
      <Cautions />
    </Section>
  );
}
