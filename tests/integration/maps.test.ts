import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { POST as ask } from '@/app/api/maps/route';
import { GET as read } from '@/app/api/maps/[mapId]/route';
import { POST as cancel } from '@/app/api/maps/[mapId]/cancel/route';
import { POST as retry } from '@/app/api/maps/[mapId]/retry/route';
import { GET as readTiles } from '@/app/api/maps/[mapId]/tiles/route';
import { problemSchema } from '@/lib/contracts/common';
import { dexterityMapSchema, MAP_TILES_MEDIA_TYPE, type MapQuestion } from '@/lib/contracts/maps';
import { readMapTiles as unpack } from '@/lib/layout/map-tiles';
import { sequelize } from '@/lib/server/database';
import { finishedMapFor } from '@/lib/server/maps';
import { failMap } from '@/lib/server/maps/fail-map';
import { mapInputOf, mapInputSchema } from '@/lib/server/maps/question';
import { runMapTile, storeTile } from '@/lib/server/maps/run-tile';
import { AuditEvent, DexterityMap } from '@/models';
import {
  callRoute,
  createArm,
  createLayout,
  createMember,
  createProject,
  createRevision,
  type TestMember,
  type Handler,
} from '@/tests/factories';
import { inProcess, question, runTiles, SEVERAL_TILES, tileJobs, tilesOf } from './support/map-jobs';

let planner: TestMember;
let colleague: TestMember;
let stranger: TestMember;

beforeAll(async () => {
  planner = await createMember('planner');
  colleague = await createMember('integrator', { organisationId: planner.organisationId });
  stranger = await createMember('admin');
});
afterAll(() => sequelize.close());

async function newQuestion(change: Partial<MapQuestion> = {}): Promise<MapQuestion> {
  return question((await createArm({ organisationId: planner.organisationId })).id, change);
}

async function askAs(member: TestMember, body: unknown) {
  const response = await callRoute(ask, { as: member, method: 'POST', path: '/api/maps', body });
  const json: unknown = await response.json();
  return { status: response.status, json, map: dexterityMapSchema.safeParse(json).data };
}

async function call(handler: Handler, member: TestMember, mapId: string, method = 'GET') {
  const response = await callRoute(handler, { as: member, method, path: `/api/maps/${mapId}`, params: { mapId } });
  return { status: response.status, json: (await response.json()) as unknown };
}

async function finishedMap(change: Partial<MapQuestion> = {}): Promise<{ id: string; asked: MapQuestion }> {
  // Questions of one arm differ by height; the arm itself would make an equal question of a new arm.
  const asked = await newQuestion({ toolHeightMm: uniqueHeight(), ...change });
  const { map } = await askAs(planner, asked);
  await runTiles(map!.id);
  return { id: map!.id, asked };
}

let height = 300;
function uniqueHeight(): number {
  height += 0.5;
  return height;
}

describe('asking for a map', () => {
  it('queues its tiles and says how far it is', async () => {
    const { status, map } = await askAs(planner, await newQuestion({ settings: SEVERAL_TILES }));
    expect(status).toBe(202);
    expect(map).toMatchObject({ state: 'queued', failure: null, summary: null, finishedAt: null });
    const jobs = await tileJobs(map!.id);
    expect(jobs).toHaveLength(map!.progress.total);
    expect(jobs.length).toBeGreaterThan(2);

    await runMapTile(jobs[0], inProcess);
    const half = await call(read, planner, map!.id);
    expect(half.json).toMatchObject({ state: 'running', progress: { done: 1, total: jobs.length } });

    await runTiles(map!.id);
    const done = dexterityMapSchema.parse((await call(read, planner, map!.id)).json);
    expect(done).toMatchObject({ state: 'done', progress: { done: jobs.length, total: jobs.length } });
    // The arm's reach bounds what it can reach: links of 0.15, 0.6, 0.63 and 0.2 m.
    expect(done.summary!.reachedAreaM2).toBeGreaterThan(1);
    expect(done.summary!.reachedAreaM2).toBeLessThan(Math.PI * 1.59 ** 2);
  });

  it('answers a second person from the store, with no job run', async () => {
    const { id, asked } = await finishedMap();
    const before = (await tileJobs(id)).length;
    const { status, map } = await askAs(colleague, asked);
    expect(status).toBe(200);
    expect(map).toMatchObject({ id, state: 'done' });
    expect(await tileJobs(id)).toHaveLength(before);
    expect(await AuditEvent.count({ where: { subjectId: id, action: 'map.asked' } })).toBe(1);
  });

  it('answers the same question about another arm of the same making from the store', async () => {
    const { id, asked } = await finishedMap();
    const twin = await createArm({ organisationId: planner.organisationId });
    expect((await askAs(planner, { ...asked, armId: twin.id })).map?.id).toBe(id);
  });

  it('computes once when ten ask at the same moment', async () => {
    const asked = await newQuestion({ settings: SEVERAL_TILES, toolHeightMm: uniqueHeight() });
    const answers = await Promise.all(
      Array.from({ length: 10 }, (_, index) => askAs(index % 2 ? planner : colleague, asked)),
    );
    const ids = new Set(answers.map(({ map }) => map!.id));
    expect(ids.size).toBe(1);
    expect(await tileJobs([...ids][0])).toHaveLength(answers[0].map!.progress.total);
  });

  it('keeps organisations apart even where they ask the same', async () => {
    const { id, asked } = await finishedMap();
    expect((await askAs(stranger, asked)).status).toBe(404);
    const own = await createArm({ organisationId: stranger.organisationId });
    const { map } = await askAs(stranger, { ...asked, armId: own.id });
    expect(map!.id).not.toBe(id);
    expect(map!.state).toBe('queued');
  });

  it('refuses more spots than a map may have and names the step that would do', async () => {
    const asked = await newQuestion();
    const settings = { ...asked.settings, stepMm: 5 };
    // A reach of 1.57 m at 5 mm would still do; a long tool takes it past a million spots.
    const tool = { ...asked.tool, zMm: 1500 };
    const { status, json } = await askAs(planner, { ...asked, tool, settings });
    expect(status).toBe(422);
    const problem = problemSchema.parse(json);
    expect(problem.errors).toEqual([{ path: 'settings.stepMm', message: problem.detail }]);
    const stepMm = Number(/step of (\d+) mm/.exec(problem.detail)?.[1]);
    expect((await askAs(planner, { ...asked, tool, settings: { ...settings, stepMm } })).status).toBe(202);
    expect((await askAs(planner, { ...asked, tool, settings: { ...settings, stepMm: stepMm - 1 } })).status).toBe(422);
  });

  it('allows fewer spots and smaller tiles where a spot is much work', async () => {
    const asked = await newQuestion();
    // A bent tool: its roll no longer turns the last joint alone and has to be searched.
    const tool = { ...asked.tool, pitchDeg: 30 };
    const at = (stepMm: number) => askAs(planner, { ...asked, tool, settings: { ...asked.settings, stepMm } });
    const { status, json } = await at(5);
    expect(status).toBe(422);
    const stepMm = Number(/step of (\d+) mm/.exec(problemSchema.parse(json).detail)?.[1]);
    expect(stepMm).toBeLessThan(10);
    const bent = (await at(50)).map!;
    const straight = (await askAs(planner, { ...asked, settings: { ...asked.settings, stepMm: 50 } })).map!;
    expect(bent.progress.total).toBe(bent.grid.rows);
    expect(straight.progress.total).toBeLessThan(3);
  });

  it('is not for viewers', async () => {
    const viewer = await createMember('viewer', { organisationId: planner.organisationId });
    expect((await askAs(viewer, await newQuestion())).status).toBe(403);
  });
});

describe('the tiles of a map', () => {
  it('are those that the computation makes, and join to the whole grid', async () => {
    const { id } = await finishedMap({ settings: SEVERAL_TILES });
    const map = await DexterityMap.findByPk(id, { rejectOnEmpty: true });
    const response = await callRoute(readTiles, { as: planner, params: { mapId: id } });
    expect(response.headers.get('content-type')).toBe(MAP_TILES_MEDIA_TYPE);
    const tile = unpack(new Uint8Array(await response.arrayBuffer()));
    expect([tile.rowFrom, tile.rowTo, tile.columns]).toEqual([0, map.grid.rows, map.grid.columns]);

    const { arm, request } = mapInputSchema.parse(map.input);
    const whole = await inProcess.computeTile({ arm, request, rowFrom: 0, rowTo: request.grid.rows });
    if ('fault' in whole) throw new Error(whole.fault);
    const length = new Uint8Array(new Uint32Array([whole.bytes.byteLength]).buffer);
    expect(tile).toEqual(unpack(Buffer.concat([length, whole.bytes])));
  });

  it('need not be sent twice', async () => {
    const { id } = await finishedMap();
    const first = await callRoute(readTiles, { as: planner, params: { mapId: id } });
    const etag = first.headers.get('etag')!;
    const again = await callRoute(readTiles, {
      as: planner,
      params: { mapId: id },
      headers: { 'if-none-match': etag },
    });
    expect(again.status).toBe(304);
    expect((await again.arrayBuffer()).byteLength).toBe(0);
  });

  it('are refused until the map is done', async () => {
    const { map } = await askAs(planner, await newQuestion({ toolHeightMm: uniqueHeight() }));
    const answer = await call(readTiles, planner, map!.id);
    expect(answer).toMatchObject({ status: 409, json: { code: 'map_not_ready' } });
  });
});

describe('a cancelled map', () => {
  it('is left alone by its queued tiles and can be started again', async () => {
    const asked = await newQuestion({ settings: SEVERAL_TILES, toolHeightMm: uniqueHeight() });
    const id = (await askAs(planner, asked)).map!.id;
    const [first] = await tileJobs(id);
    await runMapTile(first, inProcess);
    expect(await call(cancel, colleague, id, 'POST')).toMatchObject({ status: 200, json: { state: 'cancelled' } });
    await runTiles(id);
    expect((await call(read, planner, id)).json).toMatchObject({ state: 'cancelled', progress: { done: 1 } });
    expect(await AuditEvent.count({ where: { subjectId: id, action: 'map.cancelled' } })).toBe(1);

    expect((await askAs(planner, asked)).map).toMatchObject({ id, state: 'queued', progress: { done: 0 } });
    await runTiles(id);
    expect((await askAs(planner, asked)).status).toBe(200);
    expect((await tilesOf(id)).every((tile) => / of attempt 2:/.test(tile))).toBe(true);
  });

  it('cannot be one that is finished', async () => {
    const { id } = await finishedMap();
    expect(await call(cancel, planner, id, 'POST')).toMatchObject({ status: 409, json: { code: 'map_finished' } });
  });
});

describe('a map that fails', () => {
  it('says why, and a retry computes it', async () => {
    const id = (await askAs(planner, await newQuestion({ toolHeightMm: uniqueHeight() }))).map!.id;
    await runTiles(id, { ...inProcess, computeTile: async () => ({ fault: 'the arm has no wrist.' }) });
    expect((await call(read, planner, id)).json).toMatchObject({
      state: 'failed',
      failure: 'The map cannot be computed: the arm has no wrist.',
    });

    expect(await call(retry, planner, id, 'POST')).toMatchObject({
      status: 200,
      json: { state: 'queued', failure: null, progress: { done: 0 } },
    });
    await runTiles(id);
    expect((await call(read, planner, id)).json).toMatchObject({ state: 'done', failure: null });
    expect(await call(retry, planner, id, 'POST')).toMatchObject({ status: 200, json: { state: 'done' } });
  });

  it('tries again by itself where only the place broke down', async () => {
    const id = (await askAs(planner, await newQuestion({ toolHeightMm: uniqueHeight() }))).map!.id;
    const broken = { ...inProcess, computeTile: () => Promise.reject(new Error('the thread is gone')) };
    await expect(runTiles(id, broken)).rejects.toThrow('the thread is gone');
    expect((await call(read, planner, id)).json).toMatchObject({ state: 'running', failure: null });
  });

  it('is started again by the next who asks', async () => {
    const asked = await newQuestion({ toolHeightMm: uniqueHeight() });
    const id = (await askAs(planner, asked)).map!.id;
    const [job] = await tileJobs(id);
    await failMap(job, 'No worker had time.');
    expect(await askAs(colleague, asked)).toMatchObject({ status: 202, map: { id, state: 'queued', failure: null } });
  });

  it('is not retried with another computation than it was asked of', async () => {
    const id = (await askAs(planner, await newQuestion({ toolHeightMm: uniqueHeight() }))).map!.id;
    const map = await DexterityMap.findByPk(id, { rejectOnEmpty: true });
    const [job] = await tileJobs(id);
    await map.update({ input: { ...map.input, kernelVersion: 0 } });
    await expect(runMapTile(job, inProcess)).rejects.toThrow('needs computation 0');
    await failMap(job, 'No worker of that version.');
    expect(await call(retry, planner, id, 'POST')).toMatchObject({ status: 409, json: { code: 'map_outdated' } });
  });
});

describe('a worker that comes late', () => {
  it('writes nothing once another attempt has begun', async () => {
    const asked = await newQuestion({ settings: SEVERAL_TILES, toolHeightMm: uniqueHeight() });
    const id = (await askAs(planner, asked)).map!.id;
    const [late] = await tileJobs(id);
    const input = mapInputSchema.parse((await DexterityMap.findByPk(id, { rejectOnEmpty: true })).input);
    await call(cancel, planner, id, 'POST');
    await askAs(planner, asked);

    const forged = Uint8Array.of(1, 2, 3);
    expect(await storeTile(late, input, forged, inProcess)).toBe(false);
    expect(await tilesOf(id)).toHaveLength(0);

    await runTiles(id);
    const done = await tilesOf(id);
    expect(await storeTile({ ...late, attempt: 2 }, input, forged, inProcess)).toBe(false);
    await failMap(late, 'Too late.');
    expect(await tilesOf(id)).toEqual(done);
    expect((await call(read, planner, id)).json).toMatchObject({ state: 'done', failure: null });
  });

  it('changes nothing where the same tile was given to two workers', async () => {
    const fine = await newQuestion({ settings: SEVERAL_TILES, toolHeightMm: uniqueHeight() });
    const id = (await askAs(planner, fine)).map!.id;
    const [first] = await tileJobs(id);
    await Promise.all([runMapTile(first, inProcess), runMapTile(first, inProcess)]);
    expect((await call(read, planner, id)).json).toMatchObject({ progress: { done: 1 } });
  });
});

describe('who may see a map', () => {
  it('is nobody of another organisation', async () => {
    const { id } = await finishedMap();
    for (const [handler, method] of [
      [read, 'GET'],
      [readTiles, 'GET'],
      [cancel, 'POST'],
      [retry, 'POST'],
    ] as const) {
      expect(await call(handler, stranger, id, method)).toMatchObject({ status: 404, json: { code: 'not_found' } });
    }
  });

  it('is a viewer only where a revision of their project names it', async () => {
    const { organisationId } = planner;
    const project = await createProject({ organisationId });
    const other = await createProject({ organisationId });
    const viewer = await createMember('viewer', { organisationId, projectIds: [project.id] });
    const { id } = await finishedMap();
    const name = async (projectId: string): Promise<void> => {
      const layout = await createLayout({ projectId });
      const maps = [{ robotId: layout.id, mapId: id, key: '0'.repeat(64) }];
      await createRevision({ layoutId: layout.id, snapshot: { maps } });
    };
    await name(other.id);
    expect((await call(read, viewer, id)).status).toBe(404);
    await name(project.id);
    expect(await call(read, viewer, id)).toMatchObject({ status: 200, json: { id, state: 'done' } });
    expect((await callRoute(readTiles, { as: viewer, params: { mapId: id } })).status).toBe(200);
    expect((await call(cancel, viewer, id, 'POST')).status).toBe(403);
    expect((await call(retry, viewer, id, 'POST')).status).toBe(403);
  });
});

describe('the finished map of a question', () => {
  it('is there only once it is done', async () => {
    const asked = await newQuestion({ toolHeightMm: uniqueHeight() });
    expect(await finishedMapFor(planner.actor, asked)).toBeNull();
    const map = (await askAs(planner, asked)).map!;
    expect(await finishedMapFor(planner.actor, asked)).toBeNull();
    await runTiles(map.id);
    expect(await finishedMapFor(planner.actor, asked)).toEqual({ id: map.id, key: map.key });
    expect(await mapInputOf(planner.actor, asked)).toMatchObject({ request: { roll: 'free', wrist: 'held' } });
  });
});
