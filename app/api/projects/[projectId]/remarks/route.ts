import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { route } from '@/lib/server/http';
import { readProjectRemarks } from '@/lib/server/remarks/read-remarks';

const params = z.object({ projectId: idSchema });

export const GET = route({ role: 'viewer', params }, async ({ actor, params }) => ({
  remarks: await readProjectRemarks({ actor }, params.projectId),
}));
