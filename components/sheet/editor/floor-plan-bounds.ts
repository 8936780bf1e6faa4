import type { FloorPlan } from '@/lib/contracts/floor-plans';
import { pictureToFloor } from '@/lib/layout/calibrate';
import { boundsOfPoints, type FloorBounds } from '@/lib/layout/viewport';

/** The floor that a plan's picture covers; null without a plan or a scale. */
export function floorPlanBounds(floorPlan: FloorPlan | null): FloorBounds | null {
  const calibration = floorPlan?.calibration;
  if (!floorPlan || !calibration) return null;
  const { widthPx, heightPx } = floorPlan;
  const corners: [number, number][] = [
    [0, 0],
    [widthPx, 0],
    [widthPx, heightPx],
    [0, heightPx],
  ];
  return boundsOfPoints(corners.map((corner) => pictureToFloor(calibration, corner)));
}
