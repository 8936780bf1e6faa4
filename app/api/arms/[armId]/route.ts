import { z } from 'zod';
import { armChangeSchema } from '@/lib/contracts/arms';
import { idSchema } from '@/lib/contracts/common';
import { changeArm } from '@/lib/server/arms/change-arm';
import { getArm } from '@/lib/server/arms/data';
import { route } from '@/lib/server/http';

const params = z.object({ armId: idSchema });

export const GET = route({ role: 'planner', params }, ({ actor, params }) => getArm(actor, params.armId));

export const PATCH = route({ role: 'integrator', params, body: armChangeSchema }, ({ actor, params, body }) =>
  changeArm(actor, params.armId, body),
);
