import { createHash, randomUUID } from 'node:crypto';
import { beforeAll, describe, expect, it } from 'vitest';
import { PATCH as patchFloorPlan } from '@/app/api/floor-plans/[floorPlanId]/route';
import { POST as postOperations } from '@/app/api/layouts/[layoutId]/operations/route';
import { GET as list, POST } from '@/app/api/layouts/[layoutId]/revisions/route';
import { GET } from '@/app/api/revisions/[revisionId]/route';
import { problemSchema } from '@/lib/contracts/common';
import { revisionListSchema, revisionSchema, type Revision } from '@/lib/contracts/revisions';
import { questionOfRobot } from '@/lib/layout/map-question';
import { robotSchema, type Item } from '@/lib/layout/items';
import { mapSettingsSchema } from '@/lib/layout/map-settings';
import { mapInputOf, mapKey } from '@/lib/server/maps/question';
import { DexterityMap, Layout, Revision as RevisionRow, type Arm } from '@/models';
import {
  callRoute,
  createArm,
  createFloorPlan,
  createLayout,
  createMember,
  createProject,
  robotItem,
  type TestMember,
} from '@/tests/factories';

let integrator: TestMember;
let projectId: string;
let arm: Arm;

beforeAll(async () => {
  integrator = await createMember('integrator');
  projectId = (await createProject({ organisationId: integrator.organisationId })).id;
  arm = await createArm({ organisationId: integrator.organisationId });
});

const post = (layoutId: string, as = integrator, note = '') =>
  callRoute(POST, { as, method: 'POST', params: { layoutId }, body: { note } });

async function issue(layoutId: string, note = ''): Promise<Revision> {
  const response = await post(layoutId, integrator, note);
  expect(response.status).toBe(201);
  return revisionSchema.parse(await response.json());
}

async function read(revisionId: string, as = integrator): Promise<Revision> {
  const response = await callRoute(GET, { as, params: { revisionId } });
  return revisionSchema.parse(await response.json());
}

const layoutWithRobot = (items: Item[] = [robotItem(arm.id)]) => createLayout({ projectId, items });

/** A map of this robot as the worker leaves it, without the work. */
async function finishedMap(robot: Item, settings = mapSettingsSchema.parse({})): Promise<DexterityMap> {
  const question = questionOfRobot(robotSchema.parse(robot), settings);
  return DexterityMap.create({
    organisationId: integrator.organisationId,
    key: mapKey(await mapInputOf(integrator.actor, question)),
    input: {},
    grid: { originMm: [0, 0], stepMm: 25, columns: 1, rows: 1 },
    state: 'done',
    tileCount: 1,
    tilesDone: 1,
    summary: {
      reachedAreaM2: 0,
      bestInverseConditionNumber: null,
      fastestToolSpeed: null,
      quantiles: { inverseConditionNumber: [], maximumToolSpeed: [], sureSpeed: [] },
    },
    finishedAt: new Date(),
  });
}

describe('a revision', () => {
  it('freezes items, arms, floor plan and map settings under the next number', async () => {
    const floorPlan = await createFloorPlan({ projectId });
    const items = [robotItem(arm.id)];
    const layout = await layoutWithRobot(items);
    await Layout.update({ floorPlanId: floorPlan.id }, { where: { id: layout.id } });
    const revision = await issue(layout.id, 'For the kick-off');
    expect(revision).toMatchObject({
      layoutId: layout.id,
      projectId,
      number: 1,
      state: 'issued',
      note: 'For the kick-off',
      issuedBy: integrator.user.name,
    });
    expect(revision.snapshot).toMatchObject({ format: 1, letter: layout.letter, name: layout.name, items, maps: [] });
    expect(revision.snapshot.floorPlan?.id).toBe(floorPlan.id);
    expect(revision.snapshot.arms.map(({ id }) => id)).toEqual([arm.id]);
    expect((await issue(layout.id)).number).toBe(2);
  });

  it('does not change when the layout, the floor plan or the project does', async () => {
    const floorPlan = await createFloorPlan({ projectId });
    const robot = robotItem(arm.id);
    const layout = await layoutWithRobot([robot]);
    await Layout.update({ floorPlanId: floorPlan.id }, { where: { id: layout.id } });
    const before = await issue(layout.id);

    const moved = { type: 'put', baseVersion: 1, item: { ...robot, xMm: 500 } };
    const edited = await callRoute(postOperations, {
      as: integrator,
      method: 'POST',
      params: { layoutId: layout.id },
      body: { id: randomUUID(), operations: [moved] },
    });
    expect(edited.status).toBe(200);
    await callRoute(patchFloorPlan, {
      as: integrator,
      method: 'PATCH',
      params: { floorPlanId: floorPlan.id },
      body: { calibration: { scale: { fromPx: [0, 0], toPx: [9, 0], distanceMm: 9 }, originPx: [0, 0] } },
    });
    await Layout.update({ name: 'Renamed' }, { where: { id: layout.id } });
    expect(await read(before.id)).toEqual(before);
  });

  it('is refused any change by the database itself', async () => {
    const { id, snapshot } = await issue((await layoutWithRobot()).id);
    const change = RevisionRow.update({ snapshot: { ...snapshot, name: 'Forged' } }, { where: { id } });
    await expect(change).rejects.toThrow(/never changes/);
  });

  it('bears the SHA-256 of its snapshot with sorted members, whichever way it was stored', async () => {
    const { id } = await issue((await layoutWithRobot()).id);
    const { snapshot, sha256 } = await read(id);
    // Sorted here by a second, independent route: JSON's own replacer.
    const sorted = JSON.stringify(snapshot, (_key, value: unknown) =>
      value && typeof value === 'object' && !Array.isArray(value)
        ? Object.fromEntries(Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1)))
        : value,
    );
    expect(createHash('sha256').update(sorted).digest('hex')).toBe(sha256);
  });

  it('supersedes the one in review before it, and leaves an accepted one accepted', async () => {
    const layout = await layoutWithRobot();
    const accepted = await issue(layout.id);
    await RevisionRow.update({ state: 'accepted' }, { where: { id: accepted.id } });
    const second = await issue(layout.id);
    const third = await issue(layout.id);
    const response = await callRoute(list, { as: integrator, params: { layoutId: layout.id } });
    const { revisions } = revisionListSchema.parse(await response.json());
    expect(revisions.map(({ id, number, state }) => [id, number, state])).toEqual([
      [third.id, 3, 'issued'],
      [second.id, 2, 'superseded'],
      [accepted.id, 1, 'accepted'],
    ]);
  });

  it('gets a number of its own when several are issued at the same moment', async () => {
    const layout = await layoutWithRobot();
    const revisions = await Promise.all(Array.from({ length: 4 }, () => issue(layout.id)));
    expect(revisions.map(({ number }) => number).sort()).toEqual([1, 2, 3, 4]);
    expect(await RevisionRow.count({ where: { layoutId: layout.id, state: 'issued' } })).toBe(1);
  });

  it('names the finished map of each robot and leaves out what is not finished', async () => {
    const [near, far] = [robotItem(arm.id), { ...robotItem(arm.id), riserMm: 300 } as Item];
    const map = await finishedMap(near);
    const { snapshot } = await issue((await layoutWithRobot([near, far])).id);
    expect(snapshot.maps).toEqual([{ robotId: near.id, mapId: map.id, key: map.key }]);
  });

  it('is not made of an empty sheet', async () => {
    const response = await post((await createLayout({ projectId })).id);
    expect(response.status).toBe(409);
    expect(problemSchema.parse(await response.json()).code).toBe('nothing_to_issue');
  });
});

describe('who may issue and see a revision', () => {
  it('is an integrator for issuing, everyone in the organisation for reading, of viewers those of the project', async () => {
    const layout = await layoutWithRobot();
    const organisationId = integrator.organisationId;
    const planner = await createMember('planner', { organisationId });
    const viewer = await createMember('viewer', { organisationId, projectIds: [projectId] });
    const otherViewer = await createMember('viewer', { organisationId });
    const stranger = await createMember('admin');
    expect((await post(layout.id, planner)).status).toBe(403);
    expect((await post(layout.id, viewer)).status).toBe(403);
    expect((await post(layout.id, stranger)).status).toBe(404);

    const { id } = await issue(layout.id);
    const statusFor = async (as: TestMember) => (await callRoute(GET, { as, params: { revisionId: id } })).status;
    const listFor = async (as: TestMember) => (await callRoute(list, { as, params: { layoutId: layout.id } })).status;
    for (const as of [planner, viewer]) expect([await statusFor(as), await listFor(as)]).toEqual([200, 200]);
    for (const as of [otherViewer, stranger]) expect([await statusFor(as), await listFor(as)]).toEqual([404, 404]);
  });
});
