import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { route } from '@/lib/server/http';
import { verdictsOf } from '@/lib/server/judging/judge-sheet';
import { readRevision } from '@/lib/server/revisions/read-revisions';

const params = z.object({ revisionId: idSchema });

export const GET = route({ role: 'viewer', params }, async ({ actor, params }) =>
  verdictsOf((await readRevision(actor, params.revisionId)).snapshot),
);
