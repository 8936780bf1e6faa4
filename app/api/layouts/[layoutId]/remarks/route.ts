import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { route } from '@/lib/server/http';
import { readLayoutRemarks } from '@/lib/server/remarks/read-remarks';

const params = z.object({ layoutId: idSchema });

export const GET = route({ role: 'viewer', params }, async ({ actor, params }) => ({
  remarks: await readLayoutRemarks({ actor }, params.layoutId),
}));
