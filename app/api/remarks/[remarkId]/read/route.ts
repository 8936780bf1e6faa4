import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { answer, route } from '@/lib/server/http';
import { markRead } from '@/lib/server/remarks/read-mark';

const params = z.object({ remarkId: idSchema });

export const POST = route({ role: 'viewer', params }, async ({ actor, params }) =>
  answer(await markRead(actor, params.remarkId)),
);
