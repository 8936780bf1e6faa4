import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { remarkChangeSchema } from '@/lib/contracts/remarks';
import { route } from '@/lib/server/http';
import { changeRemark } from '@/lib/server/remarks/change-remark';

const params = z.object({ remarkId: idSchema });

export const PATCH = route({ role: 'planner', params, body: remarkChangeSchema }, ({ actor, params, body }) =>
  changeRemark(actor, params.remarkId, body),
);
