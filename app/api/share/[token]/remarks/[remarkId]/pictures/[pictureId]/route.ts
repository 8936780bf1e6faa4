import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { route } from '@/lib/server/http';
import { pictureResponse } from '@/lib/server/remarks/pictures';
import { openToken } from '@/lib/server/share/data';
import { sealed, tokenParam } from '@/lib/server/share/sealed';

const params = z.object({ token: tokenParam, remarkId: idSchema, pictureId: idSchema });

export const GET = sealed(
  route({ role: 'public', params }, async ({ params }) => {
    const { actor } = await openToken(params.token);
    return pictureResponse({ actor }, params.remarkId, params.pictureId);
  }),
);
