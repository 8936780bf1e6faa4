import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { route } from '@/lib/server/http';
import { cycleOf } from '@/lib/server/judging/judge-sheet';
import { readRevision } from '@/lib/server/revisions/read-revisions';

const params = z.object({ revisionId: idSchema });

export const GET = route({ role: 'viewer', params }, async ({ actor, params }) =>
  cycleOf((await readRevision(actor, params.revisionId)).snapshot),
);
