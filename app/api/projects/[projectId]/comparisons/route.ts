import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { comparisonRequestSchema } from '@/lib/contracts/comparisons';
import { keepComparison, listComparisons } from '@/lib/server/comparisons/comparisons';
import { answer, route } from '@/lib/server/http';

const params = z.object({ projectId: idSchema });

export const GET = route({ role: 'viewer', params }, async ({ actor, params }) => ({
  comparisons: await listComparisons(actor, params.projectId),
}));

export const POST = route({ role: 'planner', params, body: comparisonRequestSchema }, async ({ actor, params, body }) =>
  answer(await keepComparison(actor, params.projectId, body), { status: 201 }),
);
