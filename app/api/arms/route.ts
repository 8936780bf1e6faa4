import { armListQuerySchema, newArmSchema } from '@/lib/contracts/arms';
import { createArm } from '@/lib/server/arms/create-arm';
import { listArms } from '@/lib/server/arms/data';
import { answer, route } from '@/lib/server/http';

export const GET = route({ role: 'planner', query: armListQuerySchema }, async ({ actor, query }) => ({
  arms: await listArms(actor, query),
}));

export const POST = route({ role: 'integrator', body: newArmSchema }, async ({ actor, body }) =>
  answer(await createArm(actor, body), { status: 201 }),
);
