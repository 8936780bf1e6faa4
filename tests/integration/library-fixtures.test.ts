import { describe, expect, it } from 'vitest';
import { DELETE as deleteFixture, PATCH as renameFixture } from '@/app/api/fixtures/[fixtureId]/route';
import { GET as listFixtures, POST as saveFixture } from '@/app/api/fixtures/route';
import { problemSchema } from '@/lib/contracts/common';
import { libraryFixtureListSchema, libraryFixtureSchema } from '@/lib/contracts/library-fixtures';
import { AuditEvent, LibraryFixture } from '@/models';
import { callRoute, createLibraryFixture, createMember, fixtureContent } from '../factories';
import type { TestMember } from '../factories';

const list = async (as: TestMember) =>
  libraryFixtureListSchema.parse(await (await callRoute(listFixtures, { as })).json()).fixtures;
const save = (as: TestMember, body: unknown) => callRoute(saveFixture, { as, method: 'POST', body });

describe('the fixtures that an organisation keeps', () => {
  it('come back as they were saved, by name, with no robot of the sheet that they came from', async () => {
    const planner = await createMember('planner');
    const [second, first] = [fixtureContent('Trunnion table'), fixtureContent('Drawer tray')];
    for (const content of [second, first]) expect((await save(planner, content)).status).toBe(201);
    const kept = await list(planner);
    expect(kept.map(({ name }) => name)).toEqual(['Drawer tray', 'Trunnion table']);
    expect(kept[0].content).toEqual({
      ...first.content,
      taskPoints: first.content.taskPoints.map((point) => ({ ...point, robotId: null })),
    });
    expect(first.content.taskPoints[0].robotId).not.toBeNull();
    const [event] = await AuditEvent.findAll({ where: { subjectId: kept[0].id } });
    expect(event).toMatchObject({ action: 'fixture.saved', details: { name: 'Drawer tray' } });
  });

  it('bear one name each, whatever its letters, in one organisation', async () => {
    const [planner, stranger] = [await createMember('planner'), await createMember('planner')];
    expect((await save(planner, fixtureContent('Drawer tray'))).status).toBe(201);
    const refused = await save(planner, fixtureContent('DRAWER tray'));
    expect(refused.status).toBe(422);
    const { errors } = problemSchema.parse(await refused.json());
    expect(errors).toEqual([{ path: 'name', message: expect.stringMatching(/“Drawer tray” already/) }]);
    expect((await save(stranger, fixtureContent('Drawer tray'))).status).toBe(201);
  });

  it('are renamed, but not to a taken name, and deleted', async () => {
    const planner = await createMember('planner');
    const { organisationId } = planner;
    const fixture = await createLibraryFixture({ organisationId, name: 'Tray' });
    await createLibraryFixture({ organisationId, name: 'Table' });
    const rename = (name: string) =>
      callRoute(renameFixture, { as: planner, method: 'PATCH', params: { fixtureId: fixture.id }, body: { name } });
    expect((await rename('table')).status).toBe(422);
    // Its own name in other letters is no other fixture's.
    const renamed = libraryFixtureSchema.parse(await (await rename('TRAY')).json());
    expect(renamed.name).toBe('TRAY');
    const params = { fixtureId: fixture.id };
    expect((await callRoute(deleteFixture, { as: planner, method: 'DELETE', params })).status).toBe(204);
    expect((await list(planner)).map(({ name }) => name)).toEqual(['Table']);
  });

  it('of another organisation are not there', async () => {
    const planner = await createMember('planner');
    const foreign = await createLibraryFixture();
    const params = { fixtureId: foreign.id };
    const options = { as: planner, params, body: { name: 'Mine' } };
    expect((await callRoute(renameFixture, { ...options, method: 'PATCH' })).status).toBe(404);
    expect((await callRoute(deleteFixture, { ...options, method: 'DELETE' })).status).toBe(404);
    expect(await list(planner)).toEqual([]);
    expect(await LibraryFixture.count({ where: { id: foreign.id } })).toBe(1);
  });

  it('are refused with a crossing outline, a top below the bottom or no name', async () => {
    const planner = await createMember('planner');
    const good = fixtureContent('Tray');
    const crossed = [[0, 0], [100, 100], [100, 0], [0, 100]]; // prettier-ignore
    const bodies = [
      { ...good, name: ' ' },
      { ...good, content: { ...good.content, outlineMm: crossed } },
      { ...good, content: { ...good.content, zFromMm: 900 } },
    ];
    for (const body of bodies) expect((await save(planner, body)).status).toBe(422);
    expect(await list(planner)).toEqual([]);
  });
});
