import { z } from 'zod';
import { pictureQuerySchema } from '@/lib/contracts/floor-plans';
import { route } from '@/lib/server/http';
import { sharedPicture } from '@/lib/server/share/read-shared';
import { sealed, tokenParam } from '@/lib/server/share/sealed';

const params = z.object({ token: tokenParam });

export const GET = sealed(
  route({ role: 'public', params, query: pictureQuerySchema }, ({ params, query, request }) =>
    sharedPicture(params.token, query.width, request),
  ),
);
