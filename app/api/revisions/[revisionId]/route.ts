import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { route } from '@/lib/server/http';
import { readRevision } from '@/lib/server/revisions/read-revisions';

const params = z.object({ revisionId: idSchema });

export const GET = route({ role: 'viewer', params }, ({ actor, params }) => readRevision(actor, params.revisionId));
