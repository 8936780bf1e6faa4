import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { route } from '@/lib/server/http';
import { presentMap, cancelMap } from '@/lib/server/maps';

export const POST = route({ role: 'planner', params: z.object({ mapId: idSchema }) }, async ({ actor, params }) =>
  presentMap(await cancelMap(actor, params.mapId)),
);
