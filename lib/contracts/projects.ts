import { z } from 'zod';
import { idSchema, timestampSchema } from './common';

const title = z
  .string()
  .trim()
  .min(1, 'Give the project a name.')
  .max(120, 'A project name has at most 120 characters.');

/** POST /api/projects */
export const projectRequestSchema = z.object({
  name: title,
  customerName: z.string().trim().max(120).default(''),
  siteName: z.string().trim().max(120).default(''),
});
/** PATCH /api/projects/[projectId] */
export const projectChangeSchema = projectRequestSchema.partial().extend({ archived: z.boolean().optional() });

export const projectSchema = z.object({
  id: idSchema,
  name: z.string(),
  customerName: z.string(),
  siteName: z.string(),
  archivedAt: timestampSchema.nullable(),
  createdAt: timestampSchema,
  updatedAt: timestampSchema,
  layoutCount: z.number().int(),
  openRemarkCount: z.number().int(),
});
export type Project = z.infer<typeof projectSchema>;

/** GET /api/projects?archived=true|false&search=… */
export const projectListQuerySchema = z.object({
  archived: z.enum(['true', 'false']).default('false'),
  search: z.string().trim().max(120).default(''),
});
export const projectListSchema = z.object({ projects: z.array(projectSchema) });
