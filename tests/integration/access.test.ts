import { readdirSync } from 'node:fs';
import path from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { SESSION_COOKIE } from '@/lib/server/session/cookie';
import { Revision, ShareLink } from '@/models';
import { callRoute, createMap, createRemark, createRevision, createShareLink } from '../factories';
import type { Handler } from '../factories';
import { CALLERS, TABLE } from './support/access-table';
import type { Caller, Row } from './support/access-table';
import { buildAccessWorld, SECRET } from './support/access-world';
import type { AccessWorld } from './support/access-world';

const API = path.resolve('app/api');
/** Made by next-auth, which answers anybody; sign-in itself is tested in session.test.ts. */
const NOT_OURS = ['auth/[...nextauth]'];
const METHODS = ['GET', 'HEAD', 'POST', 'PUT', 'PATCH', 'DELETE'];

let world: AccessWorld;
beforeAll(async () => {
  world = await buildAccessWorld();
});

async function load(folder: string): Promise<Record<string, Handler>> {
  return (await import(/* @vite-ignore */ path.join(API, folder, 'route.ts'))) as Record<string, Handler>;
}

function memberOf(caller: Caller) {
  return caller === 'nobody' || caller === 'linkHolder' ? null : world.callers[caller];
}

async function ask(row: Row, caller: Caller): Promise<Response> {
  const handler = (await load(row.path))[row.method];
  const options = await row.prepare(world, caller);
  return callRoute(handler, { ...options, method: row.method, as: memberOf(caller) });
}

it('the table names every route and method, and none that does not exist', async () => {
  const folders = readdirSync(API, { recursive: true, encoding: 'utf8' })
    .filter((file) => path.basename(file) === 'route.ts')
    .map((file) => path.dirname(file))
    .filter((folder) => !NOT_OURS.includes(folder));
  const found = await Promise.all(
    folders.map(async (folder) => {
      const handlers = await load(folder);
      return METHODS.filter((method) => handlers[method]).map((method) => `${method} ${folder}`);
    }),
  );
  expect(TABLE.map(({ method, path }) => `${method} ${path}`).sort()).toEqual(found.flat().sort());
});

describe.each(TABLE)('$method /api/$path', (row) => {
  it.each(CALLERS.map((caller, column) => ({ caller, status: row.statuses[column] })))(
    'answers $caller $status',
    async ({ caller, status }) => {
      const response = await ask(row, caller);
      expect(response.status).toBe(status);
      const inside = caller === 'linkHolder' ? row.path.startsWith('share/') : !isOutside(caller);
      if (!inside) expect(Buffer.from(await response.arrayBuffer()).toString()).not.toContain(SECRET);
    },
  );
});

it('those inside do read what is kept from the others', async () => {
  for (const caller of ['viewer', 'planner'] as const) {
    for (const folder of ['projects', 'projects/[projectId]', 'revisions/[revisionId]']) {
      expect(await (await ask(rowOf('GET', folder), caller)).text()).toContain(SECRET);
    }
  }
});

function isOutside(caller: Caller): boolean {
  return caller === 'nobody' || caller === 'otherViewer' || caller === 'stranger';
}

const rowOf = (method: string, folder: string): Row => {
  const row = TABLE.find((each) => each.method === method && each.path === folder);
  if (!row) throw new Error(`${method} ${folder} is not in the table`);
  return row;
};

describe('what a viewer sees of the project itself', () => {
  it('is no variant, plan or map that was not issued', async () => {
    const as = world.callers.viewer;
    const draft = await world.addLayout();
    for (const folder of ['layouts/[layoutId]/remarks', 'layouts/[layoutId]/revisions']) {
      const { GET } = await load(folder);
      expect((await callRoute(GET, { as, params: { layoutId: draft.id } })).status).toBe(404);
    }
    const { GET: picture } = await load('floor-plans/[floorPlanId]/picture');
    const plan = await world.addFloorPlan();
    expect((await callRoute(picture, { as, params: { floorPlanId: plan.id } })).status).toBe(404);
    const map = await world.addQueuedMap();
    for (const folder of ['maps/[mapId]', 'maps/[mapId]/tiles']) {
      const { GET } = await load(folder);
      expect((await callRoute(GET, { as, params: { mapId: map.id } })).status).toBe(404);
    }
    const { GET: layouts } = await load('projects/[projectId]/layouts');
    const listed = await (await callRoute(layouts, { as, params: { projectId: world.projectId } })).text();
    expect(listed).toContain(world.layoutId);
    expect(listed).not.toContain(draft.id);
  });
});

describe('a share link', () => {
  const shareRows = TABLE.filter(({ path }) => path.startsWith('share/'));

  async function askByLink(row: Row, token: string, params: object = {}): Promise<Response> {
    const options = await row.prepare(world, 'linkHolder');
    const handler = (await load(row.path))[row.method];
    return callRoute(handler, { ...options, method: row.method, params: { ...options.params, token, ...params } });
  }

  it.each([
    ['expired', { expiresAt: new Date(Date.now() - 1000) }],
    ['revoked', { revokedAt: new Date() }],
  ])('opens nothing once it is %s', async (_how, ending) => {
    const { token } = await createShareLink({ revisionId: world.revisionId, ...ending });
    for (const row of shareRows) expect((await askByLink(row, token)).status).toBe(404);
  });

  it('opens its own revision and nothing of another one, of the same layout or not', async () => {
    const second = await createRevision({ layoutId: world.layoutId });
    const { token } = await createShareLink({ revisionId: second.id });
    const remark = await createRemark({ revisionId: world.revisionId });
    const foreign = await createMap();
    const statuses = {
      'share/[token]': 200,
      'share/[token]/remarks': 200,
      'share/[token]/picture': 404,
      'share/[token]/maps/[mapId]': 404,
      'share/[token]/maps/[mapId]/tiles': 404,
    };
    for (const [folder, status] of Object.entries(statuses)) {
      expect((await askByLink(rowOf('GET', folder), token)).status, folder).toBe(status);
    }
    const map = rowOf('GET', 'share/[token]/maps/[mapId]');
    expect((await askByLink(map, world.token, { mapId: foreign.id })).status).toBe(404);
    const reply = rowOf('POST', 'share/[token]/remarks/[remarkId]/replies');
    expect((await askByLink(reply, token, { remarkId: remark.id })).status).toBe(404);
    const listed = await (await askByLink(rowOf('GET', 'share/[token]/remarks'), token)).text();
    expect(listed).not.toContain(remark.id);
  });

  it('made for reading takes no remark and no reply', async () => {
    const { token } = await createShareLink({ revisionId: world.revisionId, mayRemark: false });
    for (const row of shareRows) {
      expect((await askByLink(row, token)).status, row.path).toBe(row.method === 'GET' ? 200 : 403);
    }
  });

  it('is worth nothing on any route of the members', async () => {
    const before = await ShareLink.count({ where: { revisionId: world.revisionId } });
    const { POST } = await load('revisions/[revisionId]/share-links');
    const headers = { authorization: `Bearer ${world.token}`, cookie: `${SESSION_COOKIE}=${world.token}` };
    const call = { method: 'POST', params: { revisionId: world.revisionId }, body: {}, headers };
    expect((await callRoute(POST, call)).status).toBe(401);
    expect(await ShareLink.count({ where: { revisionId: world.revisionId } })).toBe(before);
    expect(await Revision.count({ where: { id: world.revisionId } })).toBe(1);
  });
});
