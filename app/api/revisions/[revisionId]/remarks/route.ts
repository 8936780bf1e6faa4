import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { remarkRequestSchema } from '@/lib/contracts/remarks';
import { answer, route } from '@/lib/server/http';
import { postRemark } from '@/lib/server/remarks/post-remark';
import { readRevisionRemarks } from '@/lib/server/remarks/read-remarks';

const params = z.object({ revisionId: idSchema });

export const GET = route({ role: 'viewer', params }, async ({ actor, params }) => ({
  remarks: await readRevisionRemarks({ actor }, params.revisionId),
}));

export const POST = route({ role: 'viewer', params, body: remarkRequestSchema }, async ({ actor, params, body }) =>
  answer(await postRemark({ actor }, params.revisionId, body), { status: 201 }),
);
