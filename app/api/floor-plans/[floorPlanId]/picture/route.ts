import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { pictureQuerySchema } from '@/lib/contracts/floor-plans';
import { findFloorPlan } from '@/lib/server/floor-plans/data';
import { pictureResponse } from '@/lib/server/floor-plans/read-stored-picture';
import { route } from '@/lib/server/http';

const params = z.object({ floorPlanId: idSchema });

export const GET = route(
  { role: 'viewer', params, query: pictureQuerySchema },
  async ({ actor, params, query, request }) =>
    pictureResponse(await findFloorPlan(actor, params.floorPlanId), query.width, request),
);
