'use client';

import { ChevronDown } from 'lucide-react';
import { Button } from '@/components/ui/button';
import { Menu, MenuCheck, MenuChoice, MenuHeading, MenuRule } from '@/components/ui/menu';
import { useBoard, useBoardSheet } from './board-context';
import { useUnits } from '@/lib/client/use-units';

const GRID_MM = [10, 25, 50, 100, 250] as const;
const TURN_DEG = [1, 5, 15, 45] as const;
const NONE = 'none';

/** What places and turns snap to. Alt suspends all of it while it is held. */
export function SnapChoice() {
  const { sheet } = useBoard();
  const snapping = useBoardSheet((state) => state.snapping);
  const { length } = useUnits();
  const { gridMm, angleDeg, toItems, toPlan } = snapping;
  const isOff = gridMm === null && !toItems && !toPlan;
  return (
    <Menu
      align="start"
      trigger={
        <Button variant="quiet" size="small" className="px-2" data-snapping={gridMm ?? NONE}>
          <span className="text-ink-soft">Snap</span>
          <span>{isOff ? 'off' : gridMm === null ? 'on' : length(gridMm)}</span>
          <ChevronDown aria-hidden className="size-4" />
        </Button>
      }
    >
      <MenuHeading>Held Alt suspends it</MenuHeading>
      <MenuCheck checked={toItems} onCheckedChange={(next) => sheet.setSnapping({ ...snapping, toItems: next })}>
        Edges, centres and task points
      </MenuCheck>
      <MenuCheck checked={toPlan} onCheckedChange={(next) => sheet.setSnapping({ ...snapping, toPlan: next })}>
        Wall corners of the floor plan
      </MenuCheck>
      <MenuRule />
      <MenuChoice
        label="Grid"
        value={gridMm === null ? NONE : String(gridMm)}
        onValueChange={(value) => sheet.setSnapping({ ...snapping, gridMm: value === NONE ? null : Number(value) })}
        options={[
          ...GRID_MM.map((step) => ({ value: String(step), label: `Grid of ${length(step)}` })),
          { value: NONE, label: 'No grid' },
        ]}
      />
      <MenuRule />
      <MenuChoice
        label="Turns"
        value={angleDeg === null ? NONE : String(angleDeg)}
        onValueChange={(value) => sheet.setSnapping({ ...snapping, angleDeg: value === NONE ? null : Number(value) })}
        options={[
          ...TURN_DEG.map((step) => ({ value: String(step), label: `Turn by ${step}°` })),
          { value: NONE, label: 'Turn freely' },
        ]}
      />
    </Menu>
  );
}
