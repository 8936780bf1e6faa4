import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { route } from '@/lib/server/http';
import { presentStudy, retryStudy } from '@/lib/server/studies';

export const POST = route({ role: 'planner', params: z.object({ studyId: idSchema }) }, async ({ actor, params }) =>
  presentStudy(await retryStudy(actor, params.studyId)),
);
