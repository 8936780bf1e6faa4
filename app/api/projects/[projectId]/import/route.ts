import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { importLayout } from '@/lib/server/exports/import-layout';
import { readFile } from '@/lib/server/exports/read-file';
import { answer, route } from '@/lib/server/http';

const params = z.object({ projectId: idSchema });

/** The layout file is the body, as application/json. */
export const POST = route({ role: 'planner', params, body: 'stream' }, async ({ actor, params, request }) =>
  answer(await importLayout(actor, params.projectId, await readFile(request)), { status: 201 }),
);
