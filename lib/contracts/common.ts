import { z } from 'zod';

export const idSchema = z.uuid();
export const timestampSchema = z.iso.datetime();
export const emailSchema = z
  .email('Write an e-mail address such as name@example.com.')
  .max(254)
  .transform((value) => value.toLowerCase());
export const personNameSchema = z.string().trim().min(1, 'Write your name.').max(120);

export const roleSchema = z.enum(['planner', 'integrator', 'viewer', 'admin']);
export type Role = z.infer<typeof roleSchema>;

/** RFC 9457 problem details, as every refused request answers them. */
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  /** Stable, for programs: `stale_item`, `not_found`, … */
  code: z.string(),
  detail: z.string(),
  requestId: z.string(),
  /** One entry a refused field: path into the request, and what to do. */
  errors: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
});
export type Problem = z.infer<typeof problemSchema>;
