import { z } from 'zod';
import { newArmVersionSchema } from '@/lib/contracts/arms';
import { idSchema } from '@/lib/contracts/common';
import { listArmVersions } from '@/lib/server/arms/data';
import { saveArmVersion } from '@/lib/server/arms/save-arm-version';
import { answer, route } from '@/lib/server/http';

const params = z.object({ armId: idSchema });

export const GET = route({ role: 'planner', params }, async ({ actor, params }) => ({
  arms: await listArmVersions(actor, params.armId),
}));

export const POST = route({ role: 'integrator', params, body: newArmVersionSchema }, async ({ actor, params, body }) =>
  answer(await saveArmVersion(actor, params.armId, body), { status: 201 }),
);
