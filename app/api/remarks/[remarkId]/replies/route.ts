import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { replyRequestSchema } from '@/lib/contracts/remarks';
import { answer, route } from '@/lib/server/http';
import { postReply } from '@/lib/server/remarks/post-reply';

const params = z.object({ remarkId: idSchema });

export const POST = route({ role: 'viewer', params, body: replyRequestSchema }, async ({ actor, params, body }) =>
  answer(await postReply({ actor }, params.remarkId, body), { status: 201 }),
);
