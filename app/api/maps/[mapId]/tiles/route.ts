import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { route } from '@/lib/server/http';
import { readMapTiles, tilesResponse } from '@/lib/server/maps';

export const GET = route(
  { role: 'viewer', params: z.object({ mapId: idSchema }) },
  async ({ actor, params, request }) => tilesResponse(request, await readMapTiles(actor, params.mapId)),
);
