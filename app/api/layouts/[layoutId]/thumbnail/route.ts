import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { thumbnailQuerySchema } from '@/lib/contracts/layouts';
import { route } from '@/lib/server/http';
import { thumbnailResponse } from '@/lib/server/layouts/thumbnail';

const params = z.object({ layoutId: idSchema });

export const GET = route(
  { role: 'planner', params, query: thumbnailQuerySchema },
  ({ actor, params, query, request }) => thumbnailResponse(actor, params.layoutId, query, request),
);
