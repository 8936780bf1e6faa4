'use client';

import { useBoard } from '@/components/sheet/editor/board-context';
import { Slider } from '@/components/ui/slider';
import { useUnits } from '@/lib/client/use-units';
import { edited } from '@/lib/editor/edits';
import type { Robot } from '@/lib/layout/items';
import { useItemEdit } from './use-item-edit';

const STEP_MM = 10;
const LEAST_TOP_MM = 1500;

/** The riser under a robot along a line, with the map following; put down, it is one step that can be undone. */
export function RiserSlider({ robot }: { readonly robot: Robot }) {
  const { sheet } = useBoard();
  const { length } = useUnits();
  const edit = useItemEdit(robot);
  if (robot.locked) return null;
  const show = (riserMm: number) => {
    const now = sheet.getState().items.get(robot.id);
    const changed = now?.kind === 'robot' ? edited(now, { riserMm }) : null;
    if (changed?.ok) sheet.preview([changed.value]);
  };
  return (
    <div className="mt-1.5 flex items-center gap-2 text-[0.8125rem] text-ink-soft">
      <span className="whitespace-nowrap">Riser</span>
      <Slider
        label={`Riser of ${robot.name}, dragged`}
        min={0}
        max={Math.max(LEAST_TOP_MM, Math.ceil(robot.riserMm / 100) * 100)}
        step={STEP_MM}
        value={robot.riserMm}
        valueText={length(robot.riserMm)}
        onValueChange={show}
        onValueCommit={(riserMm) => edit('Riser', { riserMm })}
      />
      <span className="font-mono whitespace-nowrap text-ink">{length(robot.riserMm)}</span>
    </div>
  );
}
