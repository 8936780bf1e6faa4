import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { layoutRequestSchema } from '@/lib/contracts/layouts';
import { answer, route } from '@/lib/server/http';
import { createLayout } from '@/lib/server/layouts/create-layout';
import { listLayouts } from '@/lib/server/layouts/read-layouts';

const params = z.object({ projectId: idSchema });

export const GET = route({ role: 'viewer', params }, async ({ actor, params }) => ({
  layouts: await listLayouts(actor, params.projectId),
}));

export const POST = route({ role: 'planner', params, body: layoutRequestSchema }, async ({ actor, params, body }) =>
  answer(await createLayout(actor, params.projectId, body), { status: 201 }),
);
