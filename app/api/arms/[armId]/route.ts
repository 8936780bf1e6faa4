import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { getArm } from '@/lib/server/arms/data';
import { route } from '@/lib/server/http';

const params = z.object({ armId: idSchema });

export const GET = route({ role: 'planner', params }, ({ actor, params }) => getArm(actor, params.armId));
