import { randomUUID } from 'node:crypto';
import { newLibraryFixtureSchema, type NewLibraryFixture } from '@/lib/contracts/library-fixtures';
import { LibraryFixture } from '@/models';
import { unique } from './counter';
import { createOrganisation } from './people';

/** A table of 800 × 600 × 850 mm with one task point, as a sheet would save it. */
export function fixtureContent(name = unique('Fixture')): NewLibraryFixture {
  const outlineMm = [
    [-400, -300],
    [400, -300],
    [400, 300],
    [-400, 300],
  ];
  const taskPoints = [{ id: randomUUID(), name: `${name} 1`, xMm: 100, yMm: 0, zMm: 850, robotId: randomUUID() }];
  return newLibraryFixtureSchema.parse({ name, content: { outlineMm, zToMm: 850, taskPoints } });
}

export async function createLibraryFixture(options: { organisationId?: string; name?: string } = {}) {
  const organisationId = options.organisationId ?? (await createOrganisation()).id;
  return LibraryFixture.create({ organisationId, ...fixtureContent(options.name) });
}
