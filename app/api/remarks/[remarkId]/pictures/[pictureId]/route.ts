import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { route } from '@/lib/server/http';
import { pictureResponse } from '@/lib/server/remarks/pictures';

const params = z.object({ remarkId: idSchema, pictureId: idSchema });

export const GET = route({ role: 'viewer', params }, ({ actor, params }) =>
  pictureResponse({ actor }, params.remarkId, params.pictureId),
);
