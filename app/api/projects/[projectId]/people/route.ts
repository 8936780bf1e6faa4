import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { route } from '@/lib/server/http';
import { peopleOf } from '@/lib/server/remarks/people';

const params = z.object({ projectId: idSchema });

export const GET = route({ role: 'viewer', params }, async ({ actor, params }) => ({
  people: await peopleOf(actor, params.projectId),
}));
