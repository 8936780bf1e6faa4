import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { floorPlanChangeSchema } from '@/lib/contracts/floor-plans';
import { changeFloorPlan } from '@/lib/server/floor-plans/change-floor-plan';
import { readFloorPlan } from '@/lib/server/floor-plans/read-floor-plans';
import { removeFloorPlan } from '@/lib/server/floor-plans/remove-floor-plan';
import { route } from '@/lib/server/http';

const params = z.object({ floorPlanId: idSchema });

export const GET = route({ role: 'planner', params }, ({ actor, params }) => readFloorPlan(actor, params.floorPlanId));

export const PATCH = route({ role: 'planner', params, body: floorPlanChangeSchema }, ({ actor, params, body }) =>
  changeFloorPlan(actor, params.floorPlanId, body),
);

export const DELETE = route({ role: 'planner', params }, ({ actor, params }) =>
  removeFloorPlan(actor, params.floorPlanId),
);
