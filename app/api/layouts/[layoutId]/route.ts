import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { layoutChangeSchema } from '@/lib/contracts/layouts';
import { route } from '@/lib/server/http';
import { changeLayout } from '@/lib/server/layouts/change-layout';
import { readLayout } from '@/lib/server/layouts/read-layouts';
import { removeLayout } from '@/lib/server/layouts/remove-layout';

const params = z.object({ layoutId: idSchema });

export const GET = route({ role: 'planner', params }, ({ actor, params }) => readLayout(actor, params.layoutId));

export const PATCH = route({ role: 'planner', params, body: layoutChangeSchema }, ({ actor, params, body }) =>
  changeLayout(actor, params.layoutId, body),
);

export const DELETE = route({ role: 'planner', params }, ({ actor, params }) => removeLayout(actor, params.layoutId));
