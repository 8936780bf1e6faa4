import { z } from 'zod';
import { idSchema, timestampSchema } from './common';

const title = z
  .string()
  .trim()
  .min(1, 'Give the project a name.')
  .max(120, 'A project name has at most 120 characters.');

const nameOrNothing = z.string().trim().max(120, 'At most 120 characters.');

/** POST /api/projects */
export const projectRequestSchema = z.object({
  name: title,
  customerName: nameOrNothing.default(''),
  siteName: nameOrNothing.default(''),
});
export type ProjectRequest = z.infer<typeof projectRequestSchema>;
/** PATCH /api/projects/[projectId]: what is left out stays; so no defaults here, they would empty it. */
export const projectChangeSchema = z.object({
  name: title.optional(),
  customerName: nameOrNothing.optional(),
  siteName: nameOrNothing.optional(),
  archived: z.boolean().optional(),
});
export type ProjectChange = z.infer<typeof projectChangeSchema>;

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
export type ProjectListQuery = z.infer<typeof projectListQuerySchema>;
export const projectListSchema = z.object({ projects: z.array(projectSchema) });
