import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { shareLinkRequestSchema } from '@/lib/contracts/share-links';
import { answer, route } from '@/lib/server/http';
import { createShareLink, listShareLinks } from '@/lib/server/share/share-links';

const params = z.object({ revisionId: idSchema });

export const GET = route({ role: 'planner', params }, async ({ actor, params }) => ({
  shareLinks: await listShareLinks(actor, params.revisionId),
}));

export const POST = route(
  { role: 'integrator', params, body: shareLinkRequestSchema },
  async ({ actor, params, body }) => answer(await createShareLink(actor, params.revisionId, body), { status: 201 }),
);
