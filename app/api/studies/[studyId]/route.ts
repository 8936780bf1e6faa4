import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { route } from '@/lib/server/http';
import { findStudy, presentStudy } from '@/lib/server/studies';

export const GET = route({ role: 'planner', params: z.object({ studyId: idSchema }) }, async ({ actor, params }) =>
  presentStudy(await findStudy(actor, params.studyId)),
);
