import { randomUUID } from 'node:crypto';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { GET as getChanges } from '@/app/api/layouts/[layoutId]/changes/route';
import { POST } from '@/app/api/layouts/[layoutId]/operations/route';
import {
  layoutChangesSchema,
  operationResultSchema,
  staleItemsSchema,
  type LayoutChanges,
  type OperationResult,
} from '@/lib/contracts/layouts';
import { problemSchema } from '@/lib/contracts/common';
import { rectangleOutline } from '@/lib/layout/geometry';
import { obstacleSchema, type Item } from '@/lib/layout/items';
import { Layout, LayoutItem } from '@/models';
import {
  callRoute,
  createArm,
  createLayout,
  createMember,
  createProject,
  robotItem,
  type TestMember,
} from '@/tests/factories';

let planner: TestMember;
let colleague: TestMember;
let projectId: string;
let layoutId: string;

beforeAll(async () => {
  planner = await createMember('planner');
  colleague = await createMember('planner', { organisationId: planner.organisationId });
  projectId = (await createProject({ organisationId: planner.organisationId })).id;
});
beforeEach(async () => {
  layoutId = (await createLayout({ projectId })).id;
});

function block(xMm = 0, id: string = randomUUID()): Item {
  return obstacleSchema.parse({
    kind: 'obstacle',
    id,
    name: 'Block',
    xMm,
    yMm: 0,
    angleDeg: 0,
    outlineMm: rectangleOutline(400, 400),
    zToMm: 900,
  });
}

const put = (item: Item, baseVersion = 0) => ({ type: 'put', baseVersion, item });
const removal = (itemId: string, baseVersion: number) => ({ type: 'remove', baseVersion, itemId });

const send = (operations: object[], { as = planner, id = randomUUID() as string, layout = layoutId } = {}) =>
  callRoute(POST, { as, method: 'POST', params: { layoutId: layout }, body: { id, operations } });

async function edit(operations: object[], options = {}): Promise<OperationResult> {
  const response = await send(operations, options);
  expect(response.status).toBe(200);
  return operationResultSchema.parse(await response.json());
}

async function changes(since: number): Promise<LayoutChanges> {
  const response = await callRoute(getChanges, { as: colleague, params: { layoutId }, path: `/?since=${since}` });
  return layoutChangesSchema.parse(await response.json());
}

async function expectStale(response: Response): Promise<ReturnType<typeof staleItemsSchema.parse>['conflicts']> {
  expect(response.status).toBe(409);
  const document = (await response.json()) as object;
  expect(problemSchema.parse(document).code).toBe('stale_item');
  return staleItemsSchema.parse(document).conflicts;
}

describe('a batch of edits', () => {
  it('puts, changes and removes items, and says the versions to go on from', async () => {
    const [first, second] = [block(1), block(2)];
    expect(await edit([put(first), put(second)])).toEqual({
      layoutVersion: 1,
      items: [
        { id: first.id, version: 1 },
        { id: second.id, version: 1 },
      ],
    });
    const moved = { ...first, xMm: 50 };
    expect(await edit([put(moved, 1), removal(second.id, 1)])).toEqual({
      layoutVersion: 2,
      items: [{ id: first.id, version: 2 }],
    });
    const after = await changes(0);
    expect(after.items).toEqual([{ version: 2, item: moved }]);
    expect(after.removed).toEqual([second.id]);
  });

  it('is applied whole or not at all', async () => {
    const first = block();
    await edit([put(first)]);
    const conflicts = await expectStale(await send([put(block(7)), put({ ...first, xMm: 50 }, 2)]));
    expect(conflicts).toEqual([{ itemId: first.id, current: { version: 1, item: first } }]);
    const after = await changes(0);
    expect(after.layoutVersion).toBe(1);
    expect(after.items).toEqual([{ version: 1, item: first }]);
  });

  it('that is stale is answered with the newer item, or with nothing where it was removed', async () => {
    const [first, second] = [block(1), block(2)];
    await edit([put(first), put(second)]);
    const newer = { ...first, xMm: 99 };
    await edit([put(newer, 1), removal(second.id, 1)], { as: colleague });
    const conflicts = await expectStale(await send([put({ ...first, xMm: 5 }, 1), put({ ...second, xMm: 5 }, 1)]));
    expect(conflicts).toEqual([
      { itemId: first.id, current: { version: 2, item: newer } },
      { itemId: second.id, current: null },
    ]);
  });

  it('made before an item was removed and drawn anew is stale all the same', async () => {
    const first = block();
    await edit([put(first)]);
    await edit([removal(first.id, 1)], { as: colleague });
    const anew = { ...first, xMm: 700 };
    const { items } = await edit([put(anew)], { as: colleague });
    const conflicts = await expectStale(await send([put({ ...first, xMm: 5 }, 1)]));
    expect(conflicts).toEqual([{ itemId: first.id, current: { version: items[0].version, item: anew } }]);
  });

  it('sent again under its id is applied once and answered the same', async () => {
    const first = block();
    const id = randomUUID();
    const answer = await edit([put(first)], { id });
    await edit([put({ ...first, xMm: 8 }, 1)], { as: colleague });
    expect(await edit([put(first)], { id })).toEqual(answer);
    expect((await changes(0)).items).toEqual([{ version: 2, item: { ...first, xMm: 8 } }]);
    const other = await send([put(block(3))], { id });
    expect(other.status).toBe(409);
    expect(problemSchema.parse(await other.json()).code).toBe('batch_reused');
  });

  it('of two people at the same moment: one of them wins, the other is told', async () => {
    const first = block();
    await edit([put(first)]);
    const responses = await Promise.all(
      [planner, colleague, planner, colleague].map((as, index) => send([put({ ...first, xMm: index + 1 }, 1)], { as })),
    );
    expect(responses.map(({ status }) => status).sort()).toEqual([200, 409, 409, 409]);
    const won = responses.findIndex(({ status }) => status === 200);
    expect((await changes(0)).items).toEqual([{ version: 2, item: { ...first, xMm: won + 1 } }]);
  });

  it('on different items never lose one another', async () => {
    const blocks = Array.from({ length: 8 }, (_, index) => block(index));
    await Promise.all(blocks.map((item, index) => edit([put(item)], { as: index % 2 ? planner : colleague })));
    const after = await changes(0);
    expect(after.layoutVersion).toBe(8);
    expect(after.items.map(({ item }) => item.id).sort()).toEqual(blocks.map(({ id }) => id).sort());
  });

  it('sent many times at once under one id is applied once', async () => {
    const id = randomUUID();
    const item = block();
    const results = await Promise.all(Array.from({ length: 4 }, () => edit([put(item)], { id })));
    expect(new Set(results.map((result) => JSON.stringify(result))).size).toBe(1);
    expect((await changes(0)).layoutVersion).toBe(1);
  });
});

describe('items of one batch', () => {
  it('stand in the list as they were sent, also after one of them was moved', async () => {
    const blocks = Array.from({ length: 12 }, (_, index) => block(index));
    await edit(blocks.map((item) => put(item)));
    await edit([put({ ...blocks[5], xMm: 70 }, 1)]);
    expect((await changes(0)).items.map(({ item }) => item.id)).toEqual(blocks.map(({ id }) => id));
  });
});

describe('changes since a version', () => {
  it('are only those after it', async () => {
    const [first, second] = [block(1), block(2)];
    await edit([put(first)]);
    const { layoutVersion } = await edit([put(second)]);
    expect((await changes(layoutVersion)).items).toEqual([]);
    expect((await changes(layoutVersion - 1)).items.map(({ item }) => item.id)).toEqual([second.id]);
  });
});

describe('what a batch may name', () => {
  it('is arms of the own library only', async () => {
    const own = await createArm({ organisationId: planner.organisationId });
    await edit([put(robotItem(own.id))]);
    const foreign = await createArm();
    const response = await send([put(block()), put(robotItem(foreign.id))]);
    expect(response.status).toBe(422);
    expect(problemSchema.parse(await response.json()).errors).toEqual([
      { path: 'operations.1.item.armId', message: expect.stringContaining('not in your library') },
    ]);
    expect((await changes(0)).items).toHaveLength(1);
  });

  it('is items of this layout: an id of another one changes nothing there', async () => {
    const theirs = block(1);
    const stranger = await createMember('planner');
    const other = await createLayout({
      projectId: (await createProject({ organisationId: stranger.organisationId })).id,
      items: [theirs],
    });
    const conflicts = await expectStale(await send([put({ ...theirs, xMm: 666 }, 1)]));
    expect(conflicts).toEqual([{ itemId: theirs.id, current: null }]);
    await expectStale(await send([removal(theirs.id, 1)]));
    const row = await LayoutItem.findOne({ where: { layoutId: other.id, id: theirs.id }, rejectOnEmpty: true });
    expect(row.data).toEqual(theirs);
    expect(row.removedAt).toBeNull();
  });

  it('is sound items: a crossed outline and a control character are refused by name', async () => {
    const crossed = {
      ...block(),
      outlineMm: [
        [0, 0],
        [10, 10],
        [10, 0],
        [0, 10],
      ],
    };
    const response = await send([put(crossed as Item), put({ ...block(), name: 'a\u0000b' })]);
    expect(response.status).toBe(422);
    expect(problemSchema.parse(await response.json()).errors?.map(({ path }) => path)).toEqual([
      'operations.0.item.outlineMm',
      'operations.1.item.name',
    ]);
  });
});

describe('who may edit', () => {
  it('is the planners of the organisation', async () => {
    const stranger = await createMember('admin');
    const viewer = await createMember('viewer', { organisationId: planner.organisationId, projectIds: [projectId] });
    expect((await send([put(block())], { as: stranger })).status).toBe(404);
    expect((await send([put(block())], { as: viewer })).status).toBe(403);
    expect((await Layout.findByPk(layoutId, { rejectOnEmpty: true })).version).toBe(0);
  });
});
