import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { addFloorPlan } from '@/lib/server/floor-plans/add-floor-plan';
import { listFloorPlans } from '@/lib/server/floor-plans/read-floor-plans';
import { readUpload } from '@/lib/server/floor-plans/read-upload';
import { answer, route } from '@/lib/server/http';
import { findProject } from '@/lib/server/projects/data';

const params = z.object({ projectId: idSchema });

export const GET = route({ role: 'planner', params }, async ({ actor, params }) => ({
  floorPlans: await listFloorPlans(actor, params.projectId),
}));

export const POST = route({ role: 'planner', params, body: 'stream' }, async ({ actor, params, request }) => {
  // Asked before 40 MB are read for nothing.
  await findProject(actor, params.projectId);
  return answer(await addFloorPlan(actor, params.projectId, await readUpload(request)), { status: 201 });
});
