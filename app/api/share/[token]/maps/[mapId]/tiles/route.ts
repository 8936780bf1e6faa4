import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { route } from '@/lib/server/http';
import { readMapTiles, tilesResponse } from '@/lib/server/maps';
import { openToken } from '@/lib/server/share/data';
import { sealed, tokenParam } from '@/lib/server/share/sealed';

const params = z.object({ token: tokenParam, mapId: idSchema });

export const GET = sealed(
  route({ role: 'public', params }, async ({ params, request }) => {
    const { actor } = await openToken(params.token);
    return tilesResponse(request, await readMapTiles(actor, params.mapId));
  }),
);
