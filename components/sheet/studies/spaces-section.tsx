'use client';

import { useMemo } from 'react';
import { classNames } from '@/components/ui/class-names';
import { Checkbox } from '@/components/ui/checkbox';
import { useUnits } from '@/lib/client/use-units';
import { guardRows } from '@/lib/layout/spaces/guard-distance';
import { SPACE_WORDS, type SpaceKind } from '@/lib/layout/spaces/spaces';
import { Cautions } from './cautions';
import { Quiet, Section } from './section';
import { useStudyStore, useStudyView } from './study-store';
import { useSpaces } from './use-spaces';
import { useStudySubjects } from './use-study-subjects';

const KINDS: readonly SpaceKind[] = ['maximum', 'restricted', 'operating'];
const LINES: Record<SpaceKind, string> = { maximum: '––  ––', restricted: '–– · ––', operating: '· · · ·' };

/** Which spaces are drawn, how far guard lines stand off them, and what robots share. */
export function SpacesSection() {
  const { items } = useStudySubjects();
  const { robots, overlaps } = useSpaces();
  const { spaces: shown, showsOverlap } = useStudyView();
  const store = useStudyStore();
  const { unit, figure } = useUnits();
  const rows = useMemo(
    () =>
      robots.flatMap(({ robot, spaces }) =>
        guardRows(items, spaces).map((row) => ({ ...row, robotName: robot.name, robotId: robot.id })),
      ),
    [robots, items],
  );
  if (robots.length === 0) {
    return (
      <Section title="Spaces">
        <Quiet>Place a robot; its spaces are worked out from reach, tool, part and limiting devices.</Quiet>
      </Section>
    );
  }
  const toggle = (kind: SpaceKind) => (isShown: boolean) => {
    const next = new Set(shown);
    if (isShown) next.add(kind);
    else next.delete(kind);
    store.set({ spaces: next });
  };
  return (
    <Section title="Spaces">
      {KINDS.map((kind) => (
        <Checkbox
          key={kind}
          label={
            <>
              {SPACE_WORDS[kind]}{' '}
              <span aria-hidden className="font-mono text-ink-soft">
                {LINES[kind]}
              </span>
            </>
          }
          checked={shown.has(kind)}
          onCheckedChange={toggle(kind)}
        />
      ))}
      <Checkbox
        label="Floor that two robots can come to"
        checked={showsOverlap}
        onCheckedChange={(isShown) => store.set({ showsOverlap: isShown })}
      />
      {overlaps.length > 0 && (
        <ul className="text-sm" data-overlaps>
          {overlaps.map(({ names, areaM2 }) => (
            <li key={names} className="flex justify-between gap-3 border-t border-hair">
              <span>{names} share</span>
              <span className="font-mono">{areaM2.toFixed(2)} m²</span>
            </li>
          ))}
        </ul>
      )}
      <h3 className="mt-2 text-sm font-medium">Guard lines</h3>
      {rows.length === 0 ? (
        <Quiet>No guard line is drawn. Place one and its distance from every space stands here.</Quiet>
      ) : (
        <ul className="text-sm" data-guard-rows>
          {rows.map(({ robotId, robotName, guardId, guardName, space, distanceMm, pastMm }) => (
            <li key={`${robotId} ${guardId} ${space.kind}`} className="flex justify-between gap-3 border-t border-hair">
              <span className="min-w-0">
                {guardName}, {robotName} {SPACE_WORDS[space.kind].toLowerCase()}
              </span>
              <span className={classNames('font-mono whitespace-nowrap', pastMm > 0 && 'text-red')}>
                {pastMm > 0
                  ? `past by ${figure(Math.ceil(pastMm))} ${unit}`
                  : `${figure(Math.floor(distanceMm))} ${unit}`}
              </span>
            </li>
          ))}
        </ul>
      )}
      {robots.some(({ isSearching }) => isSearching) && <Quiet>Searching for the restricted space</Quiet>}
      <Quiet>
        Terms of ISO 10218-1, from memory. Outlines are drawn without dents. Stops on joints are entered with the
        robot’s values; how far the arm runs on after a stop is not in them.
      </Quiet>
      <Cautions />
    </Section>
  );
}
