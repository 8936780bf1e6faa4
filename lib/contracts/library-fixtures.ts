import { z } from 'zod';
import { fixtureSchema, itemNameSchema } from '@/lib/layout/items';
import { idSchema, timestampSchema } from './common';

/** A fixture without its place: what is the same wherever it stands. */
export const fixtureContentSchema = fixtureSchema.pick({
  outlineMm: true,
  cornersFree: true,
  zFromMm: true,
  zToMm: true,
  taskPoints: true,
  taskPaths: true,
  taskPatterns: true,
});
export type FixtureContent = z.infer<typeof fixtureContentSchema>;

export const libraryFixtureSchema = z.object({
  id: idSchema,
  name: itemNameSchema,
  content: fixtureContentSchema,
  updatedAt: timestampSchema,
});
export type LibraryFixture = z.infer<typeof libraryFixtureSchema>;

export const libraryFixtureListSchema = z.object({ fixtures: z.array(libraryFixtureSchema) });

export const newLibraryFixtureSchema = z.object({
  name: itemNameSchema,
  content: fixtureContentSchema.refine(({ zFromMm, zToMm }) => zToMm > zFromMm, {
    path: ['zToMm'],
    message: 'The top must be above the bottom.',
  }),
});
export type NewLibraryFixture = z.infer<typeof newLibraryFixtureSchema>;

export const libraryFixtureChangeSchema = z.object({ name: itemNameSchema });
export type LibraryFixtureChange = z.infer<typeof libraryFixtureChangeSchema>;
