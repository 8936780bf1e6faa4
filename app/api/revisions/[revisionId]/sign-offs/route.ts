import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { signOffRequestSchema } from '@/lib/contracts/sign-offs';
import { answer, route } from '@/lib/server/http';
import { readSignOffs } from '@/lib/server/sign-offs/read-sign-offs';
import { signRevision } from '@/lib/server/sign-offs/sign-revision';

const params = z.object({ revisionId: idSchema });

export const GET = route({ role: 'viewer', params }, ({ actor, params }) => readSignOffs(actor, params.revisionId));

export const POST = route({ role: 'viewer', params, body: signOffRequestSchema }, async ({ actor, params, body }) =>
  answer(await signRevision({ actor }, params.revisionId, body), { status: 201 }),
);
