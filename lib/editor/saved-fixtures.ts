import type { FixtureContent, LibraryFixture } from '@/lib/contracts/library-fixtures';
import { fixtureContentSchema } from '@/lib/contracts/library-fixtures';
import { withFreshIds } from '@/lib/layout/fresh-ids';
import { itemSchema, type Fixture, type Item } from '@/lib/layout/items';
import type { Items } from './changes';
import type { NewItem } from './make-items';
import { lastPlace } from './order';

/** What the library keeps of a fixture: everything but its place. */
export function contentOf(fixture: Fixture): FixtureContent {
  return fixtureContentSchema.parse(fixture);
}

/** A copy of a library fixture on a sheet, with ids of its own and a free name. */
export function copyOfSaved(items: Items, saved: LibraryFixture, at: NewItem, newId: () => string): Item {
  const original = itemSchema.parse({ kind: 'fixture', name: saved.name, angleDeg: 0, ...saved.content, ...at });
  const [copy] = withFreshIds([original], newId);
  return { ...copy, id: at.id, name: freeNameFrom(items, saved.name), order: lastPlace(items) };
}

/** The name itself, or with the first number that makes it free. */
function freeNameFrom(items: Items, name: string): string {
  const taken = new Set([...items.values()].map((item) => item.name));
  if (!taken.has(name)) return name;
  for (let count = 2; ; count += 1) {
    const suffix = ` ${count}`;
    const numbered = name.slice(0, 80 - suffix.length) + suffix;
    if (!taken.has(numbered)) return numbered;
  }
}
