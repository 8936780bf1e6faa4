import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { dropComparison } from '@/lib/server/comparisons/comparisons';
import { answer, route } from '@/lib/server/http';

const params = z.object({ comparisonId: idSchema });

export const DELETE = route({ role: 'planner', params }, async ({ actor, params }) =>
  answer(await dropComparison(actor, params.comparisonId)),
);
