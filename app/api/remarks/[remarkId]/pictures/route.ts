import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { answer, route } from '@/lib/server/http';
import { attachPicture } from '@/lib/server/remarks/pictures';

const params = z.object({ remarkId: idSchema });

export const POST = route({ role: 'viewer', params, body: 'stream' }, async ({ actor, params, request }) =>
  answer(await attachPicture({ actor }, params.remarkId, request), { status: 201 }),
);
