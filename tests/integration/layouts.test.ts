import { randomUUID } from 'node:crypto';
import { beforeAll, describe, expect, it } from 'vitest';
import { DELETE, GET, PATCH } from '@/app/api/layouts/[layoutId]/route';
import { GET as list, POST } from '@/app/api/projects/[projectId]/layouts/route';
import { layoutListSchema, layoutSchema, layoutSummarySchema, type LayoutSummary } from '@/lib/contracts/layouts';
import { problemSchema } from '@/lib/contracts/common';
import { rectangleOutline } from '@/lib/layout/geometry';
import { dimensionSchema, fixtureSchema, obstacleSchema, type Item } from '@/lib/layout/items';
import { mapSettingsSchema } from '@/lib/layout/map-settings';
import { Layout, Project } from '@/models';
import {
  callRoute,
  createArm,
  createFloorPlan,
  createLayout,
  createMember,
  createProject,
  createRevision,
  robotItem,
  type TestMember,
} from '@/tests/factories';

let planner: TestMember;
let projectId: string;

beforeAll(async () => {
  planner = await createMember('planner');
  projectId = (await createProject({ organisationId: planner.organisationId })).id;
});

const post = (as: TestMember, project: string, body: object) =>
  callRoute(POST, { as, method: 'POST', params: { projectId: project }, body });

async function newLayout(project: string, body: object): Promise<LayoutSummary> {
  const response = await post(planner, project, body);
  expect(response.status).toBe(201);
  return layoutSummarySchema.parse(await response.json());
}

async function read(layoutId: string, as = planner) {
  const response = await callRoute(GET, { as, params: { layoutId } });
  return layoutSchema.parse(await response.json());
}

const patch = (layoutId: string, body: object, as = planner) =>
  callRoute(PATCH, { as, method: 'PATCH', params: { layoutId }, body });

const remove = (layoutId: string, as = planner) => callRoute(DELETE, { as, method: 'DELETE', params: { layoutId } });

function fixture(order?: number): Item {
  return fixtureSchema.parse({
    kind: 'fixture',
    id: randomUUID(),
    name: 'Infeed tray',
    xMm: 1000,
    yMm: 2000,
    angleDeg: 8,
    order,
    outlineMm: rectangleOutline(840, 840),
    zToMm: 800,
    taskPoints: [{ id: randomUUID(), name: 'Infeed 1', xMm: 0, yMm: 0, zMm: 850 }],
  });
}

function column(order?: number): Item {
  return obstacleSchema.parse({
    kind: 'obstacle',
    id: randomUUID(),
    name: 'Column',
    xMm: 0,
    yMm: 0,
    angleDeg: 0,
    order,
    outlineMm: rectangleOutline(400, 400),
    zToMm: 3000,
  });
}

describe('a variant', () => {
  it('gets the next letter, an empty sheet and the usual map settings', async () => {
    const { id } = await createProject({ organisationId: planner.organisationId });
    expect((await newLayout(id, { name: 'As drawn' })).letter).toBe('A');
    const second = await newLayout(id, { name: ' Robots face to face ' });
    expect(second).toMatchObject({ letter: 'B', name: 'Robots face to face', version: 0, itemCount: 0 });
    const sheet = await read(second.id);
    expect(sheet).toMatchObject({ items: [], arms: [], floorPlan: null, latestRevision: null });
    expect(sheet.mapSettings).toEqual(mapSettingsSchema.parse({}));
  });

  it('gets a letter of its own when several are made at the same moment', async () => {
    const { id } = await createProject({ organisationId: planner.organisationId });
    const made = await Promise.all(Array.from({ length: 6 }, (_, index) => newLayout(id, { name: `V${index}` })));
    expect(made.map(({ letter }) => letter).sort()).toEqual(['A', 'B', 'C', 'D', 'E', 'F']);
    const listed = layoutListSchema.parse(
      await (await callRoute(list, { as: planner, params: { projectId: id } })).json(),
    );
    expect(listed.layouts.map(({ letter }) => letter)).toEqual(['A', 'B', 'C', 'D', 'E', 'F']);
  });

  it('starts as a copy with items and task points of its own', async () => {
    const arm = await createArm({ organisationId: planner.organisationId });
    const items = [robotItem(arm.id), fixture()];
    const model = await createLayout({ projectId, items });
    const floorPlan = await createFloorPlan({ projectId });
    await Layout.update({ floorPlanId: floorPlan.id }, { where: { id: model.id } });
    const mapSettings = mapSettingsSchema.parse({ toolHeightMm: 1200 });
    await patch(model.id, { mapSettings });

    const copy = await newLayout(projectId, { name: 'Copy', copyOf: model.id });
    expect(copy).toMatchObject({ itemCount: 2, floorPlanId: floorPlan.id, version: 0 });
    const sheet = await read(copy.id);
    expect(sheet.mapSettings).toEqual(mapSettings);
    expect(sheet.arms.map(({ id }) => id)).toEqual([arm.id]);
    const withoutIds = (list: Item[]) =>
      JSON.parse(JSON.stringify(list), (key, value: unknown) => (key === 'id' ? undefined : value)) as unknown;
    const copies = sheet.items.map(({ item }) => item);
    expect(withoutIds(copies)).toEqual(withoutIds(items));
    const idsOf = (list: Item[]) =>
      list.flatMap((item) => [item.id, ...(item.kind === 'fixture' ? item.taskPoints.map(({ id }) => id) : [])]);
    expect(idsOf(copies).filter((id) => idsOf(items).includes(id))).toEqual([]);
    expect(sheet.items.every(({ version }) => version === 1)).toBe(true);
  });

  it('copies what points from one item to another as pointing to the copies', async () => {
    const arm = await createArm({ organisationId: planner.organisationId });
    const held = fixture();
    const [point] = held.kind === 'fixture' ? held.taskPoints : [];
    const groupId = randomUUID();
    const robot: Item = {
      ...(robotItem(arm.id) as Extract<Item, { kind: 'robot' }>),
      groupId,
      sequence: [
        {
          kind: 'point',
          id: randomUUID(),
          fixtureId: held.id,
          taskPointId: point.id,
          place: null,
          motion: 'joint',
          viaMm: [],
        },
      ],
    };
    const dimension = dimensionSchema.parse({
      kind: 'dimension',
      id: randomUUID(),
      name: 'Apart',
      xMm: 0,
      yMm: 0,
      angleDeg: 0,
      fromMm: [0, 0],
      toMm: [100, 0],
      fromItemId: robot.id,
      toItemId: held.id,
    });
    const model = await createLayout({ projectId, items: [robot, { ...held, groupId }, dimension] });
    const sheet = await read((await newLayout(projectId, { name: 'Copy', copyOf: model.id })).id);
    const copies = sheet.items.map(({ item }) => item);
    const [robotCopy, fixtureCopy, dimensionCopy] = ['robot', 'fixture', 'dimension'].map((kind) =>
      copies.find((item) => item.kind === kind),
    );
    const pointCopy = fixtureCopy?.kind === 'fixture' ? fixtureCopy.taskPoints[0] : undefined;
    expect(robotCopy).toMatchObject({
      groupId: fixtureCopy?.groupId,
      sequence: [{ fixtureId: fixtureCopy?.id, taskPointId: pointCopy?.id }],
    });
    expect(robotCopy?.groupId).not.toBe(groupId);
    expect(dimensionCopy).toMatchObject({ fromItemId: robotCopy?.id, toItemId: fixtureCopy?.id });
  });

  it('is not copied from another project, even one of our own', async () => {
    const elsewhere = await createLayout({
      projectId: (await createProject({ organisationId: planner.organisationId })).id,
    });
    const response = await post(planner, projectId, { name: 'Copy', copyOf: elsewhere.id });
    expect(response.status).toBe(422);
    expect(problemSchema.parse(await response.json()).errors?.[0].path).toBe('copyOf');
  });

  it('lists items without a place first, then by place, then as they came', async () => {
    const items = [column(2), column(1), column(), column(1)];
    const layout = await createLayout({ projectId, items });
    const listed = (await read(layout.id)).items.map(({ item }) => item.id);
    expect(listed).toEqual([items[2].id, items[1].id, items[3].id, items[0].id]);
  });

  it('is renamed, laid on a floor plan and asked another map question', async () => {
    const layout = await createLayout({ projectId });
    const floorPlan = await createFloorPlan({ projectId });
    const mapSettings = mapSettingsSchema.parse({ measure: 'sureSpeed', stepMm: 50 });
    const response = await patch(layout.id, { name: 'R2 turned in', floorPlanId: floorPlan.id, mapSettings });
    expect(layoutSummarySchema.parse(await response.json())).toMatchObject({
      name: 'R2 turned in',
      floorPlanId: floorPlan.id,
    });
    const sheet = await read(layout.id);
    expect(sheet.mapSettings).toEqual(mapSettings);
    expect(sheet.floorPlan?.id).toBe(floorPlan.id);
    await patch(layout.id, { floorPlanId: null });
    expect(await read(layout.id)).toMatchObject({ name: 'R2 turned in', floorPlan: null });
  });

  it('is deleted until it was issued', async () => {
    const draft = await createLayout({ projectId });
    expect((await remove(draft.id)).status).toBe(204);
    expect(await Layout.findByPk(draft.id)).toBeNull();

    const issued = await createLayout({ projectId });
    await createRevision({ layoutId: issued.id });
    const response = await remove(issued.id);
    expect(response.status).toBe(409);
    expect(problemSchema.parse(await response.json()).code).toBe('layout_issued');
    expect(await Layout.findByPk(issued.id)).not.toBeNull();
  });
});

describe('who may see a variant', () => {
  it('is its organisation alone', async () => {
    const stranger = await createMember('admin');
    const layout = await createLayout({ projectId });
    expect((await callRoute(GET, { as: stranger, params: { layoutId: layout.id } })).status).toBe(404);
    expect((await patch(layout.id, { name: 'Theirs' }, stranger)).status).toBe(404);
    expect((await remove(layout.id, stranger)).status).toBe(404);
    expect((await post(stranger, projectId, { name: 'New' })).status).toBe(404);
    expect((await callRoute(list, { as: stranger, params: { projectId } })).status).toBe(404);
  });

  it('is, of viewers, nobody before it is issued; then they see it as issued', async () => {
    const project = await Project.create({ organisationId: planner.organisationId, name: 'Shared' });
    const viewer = await createMember('viewer', { organisationId: planner.organisationId, projectIds: [project.id] });
    const layout = await createLayout({ projectId: project.id, items: [column()] });
    const listed = async () =>
      layoutListSchema.parse(await (await callRoute(list, { as: viewer, params: { projectId: project.id } })).json())
        .layouts;
    expect(await listed()).toEqual([]);

    const revision = await createRevision({ layoutId: layout.id });
    await patch(layout.id, { name: 'Secret plan' });
    const [seen] = await listed();
    expect(seen).toMatchObject({ id: layout.id, name: layout.name, itemCount: 0, floorPlanId: null });
    expect(seen.latestRevision).toEqual({ id: revision.id, number: 1, state: 'issued' });
    expect((await callRoute(GET, { as: viewer, params: { layoutId: layout.id } })).status).toBe(403);
  });
});
