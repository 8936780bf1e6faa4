import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { issueRequestSchema } from '@/lib/contracts/revisions';
import { answer, route } from '@/lib/server/http';
import { issueRevision } from '@/lib/server/revisions/issue-revision';
import { listRevisions } from '@/lib/server/revisions/read-revisions';

const params = z.object({ layoutId: idSchema });

export const GET = route({ role: 'viewer', params }, async ({ actor, params }) => ({
  revisions: await listRevisions(actor, params.layoutId),
}));

export const POST = route({ role: 'integrator', params, body: issueRequestSchema }, async ({ actor, params, body }) =>
  answer(await issueRevision(actor, params.layoutId, body), { status: 201 }),
);
