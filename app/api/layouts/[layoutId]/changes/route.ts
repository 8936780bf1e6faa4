import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { layoutChangesQuerySchema } from '@/lib/contracts/layouts';
import { route } from '@/lib/server/http';
import { readChanges } from '@/lib/server/layouts/read-layouts';

const params = z.object({ layoutId: idSchema });

export const GET = route({ role: 'planner', params, query: layoutChangesQuerySchema }, ({ actor, params, query }) =>
  readChanges(actor, params.layoutId, query.since),
);
