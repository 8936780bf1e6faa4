'use client';

import { useBoardSheet, useView } from '@/components/sheet/editor/board-context';
import { ScaleBar } from '@/components/sheet/map-key/scale-bar';
import { Button } from '@/components/ui/button';
import { useStudyStore } from './study-store';
import { useStudyFloor, type StudyFloor } from './use-study-floor';

/** Says that the floor shows a study now, with its scale, and leads back to the dexterity map. */
export function StudyLegend() {
  const floor = useStudyFloor();
  const store = useStudyStore();
  const { mapScale } = useView();
  const mover = useBoardSheet((state) => (floor ? state.items.get(floor.moverId) : undefined));
  if (!floor || !mover) return null;
  const digits = floor.kind === 'standing' ? 2 : 3;
  return (
    <aside
      aria-label={TITLES[floor.kind]}
      data-study-legend={floor.kind}
      className="absolute top-2 left-2 max-w-[min(20rem,92%)] border border-rule bg-sheet px-2.5 py-1.5 text-sm"
    >
      <p className="font-semibold">
        {TITLES[floor.kind]} of {mover.name}
      </p>
      <p className="text-[0.8125rem] leading-4.5 text-ink-soft">{wordsOf(floor)}</p>
      <div className="mt-1 flex items-center gap-2 font-mono text-[0.8125rem]">
        {floor.range.from.toFixed(digits)}
        <ScaleBar scale={mapScale} className="h-2.5 min-w-0 flex-1" />
        {floor.range.to.toFixed(digits)}
        {floor.kind === 'errorGain' && ' mm'}
        <Button variant="quiet" size="small" onClick={() => store.set({ shown: null })}>
          Hide
        </Button>
      </div>
    </aside>
  );
}

const TITLES = { standing: 'Standing map', errorGain: 'Error gain map' } as const;

function wordsOf({ kind, pointCount, best }: StudyFloor): string {
  if (kind === 'errorGain')
    return 'How far the tool may be off with every joint at its worst, for every spot of the tool point.';
  const points = pointCount === 1 ? 'one point' : `${pointCount} points`;
  const cross = best ? ' The cross is the best place.' : '';
  return `Worst inverse condition number over ${points}, for every place. Bare floor: taken, or a point is out of reach.${cross}`;
}
