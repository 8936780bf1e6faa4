import { projectListQuerySchema, projectRequestSchema } from '@/lib/contracts/projects';
import { answer, route } from '@/lib/server/http';
import { createProject } from '@/lib/server/projects/create-project';
import { listProjects } from '@/lib/server/projects/data';
import { presentProject } from '@/lib/server/projects/present';

export const GET = route({ role: 'viewer', query: projectListQuerySchema }, async ({ actor, query }) => ({
  projects: (await listProjects(actor, query)).map(presentProject),
}));

export const POST = route({ role: 'planner', body: projectRequestSchema }, async ({ actor, body }) =>
  answer(await createProject(actor, body), { status: 201 }),
);
