import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { route } from '@/lib/server/http';
import { presentMap, retryMap } from '@/lib/server/maps';

export const POST = route({ role: 'planner', params: z.object({ mapId: idSchema }) }, async ({ actor, params }) =>
  presentMap(await retryMap(actor, params.mapId)),
);
