import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { presenceReportSchema } from '@/lib/contracts/presence';
import { route } from '@/lib/server/http';
import { reportPresence } from '@/lib/server/presence/report-presence';

const params = z.object({ layoutId: idSchema });

export const POST = route({ role: 'planner', params, body: presenceReportSchema }, ({ actor, params, body }) =>
  reportPresence(actor, params.layoutId, body),
);
