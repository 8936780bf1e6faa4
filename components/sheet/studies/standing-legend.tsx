'use client';

import { useBoardSheet, useView } from '@/components/sheet/editor/board-context';
import { ScaleBar } from '@/components/sheet/map-key/scale-bar';
import { Button } from '@/components/ui/button';
import { useStudyStore } from './study-store';
import { useStandingOnFloor } from './use-standing-map';

/** Says that the floor shows a standing map now, with its scale, and leads back to the dexterity map. */
export function StandingLegend() {
  const shown = useStandingOnFloor();
  const store = useStudyStore();
  const { mapScale } = useView();
  const mover = useBoardSheet((state) => (shown ? state.items.get(shown.asked.moverId) : undefined));
  if (!shown || !mover) return null;
  return (
    <aside
      aria-label="Standing map"
      data-standing-legend
      className="absolute top-2 left-2 max-w-[min(20rem,92%)] border border-rule bg-sheet px-2.5 py-1.5 text-sm"
    >
      <p className="font-semibold">Standing map of {mover.name}</p>
      <p className="text-[0.8125rem] leading-4.5 text-ink-soft">
        Worst inverse condition number over {shown.asked.work.length} points, for every place; bare floor: taken, or a
        point is out of reach. The cross is the best place.
      </p>
      <div className="mt-1 flex items-center gap-2 font-mono text-[0.8125rem]">
        0
        <ScaleBar scale={mapScale} className="h-2.5 min-w-0 flex-1" />
        {shown.range.to.toFixed(2)}
        <Button variant="quiet" size="small" onClick={() => store.set({ isStandingShown: false })}>
          Hide
        </Button>
      </div>
    </aside>
  );
}
