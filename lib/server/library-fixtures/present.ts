import { fixtureContentSchema, type LibraryFixture as Answer } from '@/lib/contracts/library-fixtures';
import type { LibraryFixture } from '@/models';

/** Read through the schema, so that a fixture saved before a field was there gets its default. */
export function presentLibraryFixture({ id, name, content, updatedAt }: LibraryFixture): Answer {
  return { id, name, content: fixtureContentSchema.parse(content), updatedAt: updatedAt.toISOString() };
}
