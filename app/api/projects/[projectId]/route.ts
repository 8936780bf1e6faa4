import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { projectChangeSchema } from '@/lib/contracts/projects';
import { route } from '@/lib/server/http';
import { changeProject } from '@/lib/server/projects/change-project';
import { findCountedProject } from '@/lib/server/projects/data';
import { presentProject } from '@/lib/server/projects/present';

const params = z.object({ projectId: idSchema });

export const GET = route({ role: 'viewer', params }, async ({ actor, params }) =>
  presentProject(await findCountedProject(actor, params.projectId)),
);

export const PATCH = route({ role: 'planner', params, body: projectChangeSchema }, ({ actor, params, body }) =>
  changeProject(actor, params.projectId, body),
);
