import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { answer, route } from '@/lib/server/http';
import { restoreRevision } from '@/lib/server/revisions/restore-revision';

const params = z.object({ revisionId: idSchema });

export const POST = route({ role: 'planner', params }, async ({ actor, params }) =>
  answer(await restoreRevision(actor, params.revisionId), { status: 201 }),
);
