'use client';

import { ChevronDown } from 'lucide-react';
import Link from 'next/link';
import { Button } from '@/components/ui/button';
import { Menu, MenuChoice, MenuHeading, MenuItem, MenuRule } from '@/components/ui/menu';
import { toast } from '@/components/ui/toaster';
import { sayError, send } from '@/lib/client/fetcher';
import { useAnswer } from '@/lib/client/use-answer';
import { floorPlanListSchema, type FloorPlan } from '@/lib/contracts/floor-plans';
import { carriedCalibration } from '@/lib/layout/carry-calibration';
import { useBoard } from './board-context';

const NONE = 'none';

/** The project's floor plans, for the sheet to lie on one of them. */
export function useProjectFloorPlans(projectId: string) {
  return useAnswer(`/api/projects/${encodeURIComponent(projectId)}/floor-plans`, floorPlanListSchema);
}

/** Which floor plan lies under the sheet. */
export function FloorPlanChoice() {
  const { projectId, floorPlan, chooseFloorPlan } = useBoard();
  const { data, mutate } = useProjectFloorPlans(projectId);
  const plans = data?.floorPlans ?? [];
  const choose = (value: string) => {
    swap(value === NONE ? null : (plans.find(({ id }) => id === value) ?? null)).catch((error: unknown) =>
      toast.error(sayError(error)),
    );
  };
  /** Items stand on the floor, so they stay; a newer picture of the same sheet takes the scale of the one before it. */
  const swap = async (next: FloorPlan | null) => {
    const carried = next && !next.calibration && floorPlan?.calibration;
    const calibration = carried && carriedCalibration(carried, floorPlan, next);
    if (next && calibration) {
      await send('PATCH', `/api/floor-plans/${encodeURIComponent(next.id)}`, { calibration });
      await mutate();
    }
    await chooseFloorPlan(next?.id ?? null);
    if (next && calibration) {
      toast(`${next.name} has the scale and origin of ${floorPlan?.name}. Check a distance on it.`);
    } else if (carried) {
      toast(`${next.name} has another shape than ${floorPlan?.name}. Set it to scale by itself.`);
    }
  };
  return (
    <Menu
      align="start"
      trigger={
        <Button variant="quiet" size="small" className="px-2">
          <span className="text-ink-soft">Floor plan</span>
          <span className="max-w-40 truncate">{floorPlan?.name ?? 'none'}</span>
          <ChevronDown aria-hidden className="size-4" />
        </Button>
      }
    >
      <MenuChoice
        label="Floor plan of this sheet"
        value={floorPlan?.id ?? NONE}
        onValueChange={choose}
        options={[
          ...plans.map(({ id, name, calibration }) => ({
            value: id,
            label: (
              <span>
                {name}
                {!calibration && <span className="block text-[0.8125rem] leading-4 text-ink-soft">no scale yet</span>}
              </span>
            ),
          })),
          { value: NONE, label: 'None' },
        ]}
      />
      {plans.length === 0 && <MenuHeading>This project has no floor plan yet.</MenuHeading>}
      <MenuRule />
      {floorPlan && (
        <MenuItem asChild>
          <Link href={`/projects/${projectId}/floor-plans/${floorPlan.id}`}>Scale and origin of {floorPlan.name}</Link>
        </MenuItem>
      )}
      <MenuItem asChild>
        <Link href={`/projects/${projectId}#floor-plans`}>Upload a floor plan</Link>
      </MenuItem>
    </Menu>
  );
}
