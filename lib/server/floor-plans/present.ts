import type { FloorPlan as FloorPlanAnswer } from '@/lib/contracts/floor-plans';
import type { FloorPlan } from '@/models';

export function presentFloorPlan(floorPlan: FloorPlan): FloorPlanAnswer {
  return {
    id: floorPlan.id,
    projectId: floorPlan.projectId,
    name: floorPlan.name,
    widthPx: floorPlan.widthPx,
    heightPx: floorPlan.heightPx,
    pictureWidths: floorPlan.pictureWidths,
    calibration: floorPlan.calibration,
    createdAt: floorPlan.createdAt.toISOString(),
  };
}
