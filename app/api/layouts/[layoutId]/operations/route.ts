import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { operationBatchSchema } from '@/lib/contracts/layouts';
import { route } from '@/lib/server/http';
import { editLayout } from '@/lib/server/layouts/edit-layout';

const params = z.object({ layoutId: idSchema });

export const POST = route({ role: 'planner', params, body: operationBatchSchema }, ({ actor, params, body }) =>
  editLayout(actor, params.layoutId, body),
);
