import { QueryTypes } from 'sequelize';
import { afterAll, afterEach, beforeAll, describe, expect, it, vi } from 'vitest';
import { sequelize } from '@/lib/server/database';
import { deadLetterOf, mapTileJob } from '@/lib/server/jobs';
import { askMap, findMap, retryMap } from '@/lib/server/maps';
import { computeTile } from '@/lib/server/maps/compute';
import { mapInputSchema } from '@/lib/server/maps/question';
import { rowsOfTile } from '@/lib/server/maps/tiling';
import { enqueue, QUEUE_SCHEMA } from '@/lib/server/queue';
import { DexterityMap, MapTile } from '@/models';
import { createArm, createMember, type TestMember } from '@/tests/factories';
import { question } from './support/map-jobs';
import { dropOwnDatabase, makeOwnDatabase } from './support/own-database';
import { startWorker, type WorkerProcess } from './support/worker-process';

const { adminUrl } = vi.hoisted(() => {
  const given = process.env.DATABASE_URL!;
  const own = new URL(given);
  own.pathname = `/map_worker_${process.pid}`;
  process.env.DATABASE_URL = own.href;
  return { adminUrl: given };
});

let planner: TestMember;
const workers: WorkerProcess[] = [];

beforeAll(async () => {
  await makeOwnDatabase(adminUrl);
  planner = await createMember('planner');
});
afterEach(async () => {
  await Promise.all(workers.splice(0).map((worker) => worker.kill()));
});
afterAll(async () => {
  await dropOwnDatabase(adminUrl);
  process.env.DATABASE_URL = adminUrl;
});

async function start(): Promise<WorkerProcess> {
  const worker = await startWorker({ MAP_THREADS: '1' });
  workers.push(worker);
  return worker;
}

/** A map of some dozens of tiles: its bent tool makes every roll a search. */
async function askSlowMap(toolHeightMm = 300): Promise<DexterityMap> {
  const arm = await createArm({ organisationId: planner.organisationId });
  const tool = { xMm: 20, yMm: 0, zMm: 100, rollDeg: 0, pitchDeg: 20, yawDeg: 0 };
  const settings = {
    tiltDeg: 0,
    towards: 'outward',
    rollDeg: 'free',
    wrist: 'free',
    branch: 'best',
    coneDeg: 0,
    stepMm: 75,
  } as const;
  return askMap(planner.actor, question(arm.id, { tool, settings, toolHeightMm }));
}

async function askQuickMap(toolHeightMm: number): Promise<DexterityMap> {
  const arm = await createArm({ organisationId: planner.organisationId });
  return askMap(planner.actor, question(arm.id, { toolHeightMm }));
}

interface JobRow {
  state: string;
  retryCount: number;
}

function jobsOf(mapId: string): Promise<JobRow[]> {
  return sequelize.query<JobRow>(
    `SELECT state::text, retry_count AS "retryCount" FROM ${QUEUE_SCHEMA}.job WHERE name = $1 AND data ->> 'mapId' = $2`,
    { bind: [mapTileJob.name, mapId], type: QueryTypes.SELECT },
  );
}

async function waitFor<T>(look: () => Promise<T | null | false>, pauseMs = 50): Promise<T> {
  for (;;) {
    const found = await look();
    if (found) return found;
    await new Promise((resolve) => setTimeout(resolve, pauseMs));
  }
}

function waitForState(mapId: string, state: DexterityMap['state']): Promise<DexterityMap> {
  return waitFor(async () => {
    const map = await findMap(planner.actor, mapId);
    return map.state === state && map;
  });
}

/** Holds the worker still at a moment when it has a tile in hand and others are stored, and kills it there. */
async function killInTheMiddle(worker: WorkerProcess, mapId: string): Promise<void> {
  await waitFor(async () => {
    worker.process.kill('SIGSTOP');
    const active = (await jobsOf(mapId)).filter(({ state }) => state === 'active').length;
    const { tilesDone } = await findMap(planner.actor, mapId);
    if (active > 0 && tilesDone >= 2) return true;
    worker.process.kill('SIGCONT');
    return false;
  });
  await worker.kill();
}

/** The tiles as this process computes them. */
function tilesComputedHere(map: DexterityMap): Buffer[] {
  const { arm, request } = mapInputSchema.parse(map.input);
  return Array.from({ length: map.tileCount }, (_, index) => {
    const result = computeTile({ arm, request, ...rowsOfTile(request.grid, map.tileCount, index) });
    if ('fault' in result) throw new Error(result.fault);
    return Buffer.from(result.bytes);
  });
}

async function storedTiles(mapId: string): Promise<Buffer[]> {
  const tiles = await MapTile.findAll({ where: { mapId }, order: [['index', 'ASC']] });
  return tiles.map(({ bytes }) => bytes);
}

describe('a worker killed in the middle of a map', () => {
  it('leaves what another one finishes to the same bytes', { timeout: 240_000 }, async () => {
    const { id, tileCount } = await askSlowMap();
    expect(tileCount).toBeGreaterThan(20);
    await killInTheMiddle(await start(), id);

    const half = await findMap(planner.actor, id);
    expect(half.state).toBe('running');
    expect(half.tilesDone).toBeLessThan(tileCount);

    const second = await start();
    const done = await waitForState(id, 'done');
    expect(done).toMatchObject({ attempt: 1, tilesDone: tileCount, failure: null });
    const stored = await storedTiles(id);
    const wanted = tilesComputedHere(done);
    expect(stored).toHaveLength(wanted.length);
    stored.forEach((bytes, index) => expect(bytes.equals(wanted[index])).toBe(true));

    // Stopping waits for the last note of a job done, so all of them are there afterwards.
    expect(await second.stop()).toBe(0);
    const jobs = await jobsOf(id);
    expect(jobs).toHaveLength(tileCount);
    expect(jobs.every(({ state }) => state === 'completed')).toBe(true);
    expect(jobs.some(({ retryCount }) => retryCount > 0)).toBe(true);
  });
});

describe('a worker', () => {
  it('is shared with others: two workers finish one map', { timeout: 120_000 }, async () => {
    const [first, second] = await Promise.all([start(), start()]);
    const { id } = await askSlowMap(310);
    await waitForState(id, 'done');
    for (const worker of [first, second]) expect(worker.messages).toContain('job done');
  });

  it('finishes the tile in hand when it is told to stop', { timeout: 120_000 }, async () => {
    const worker = await start();
    const { id } = await askSlowMap(320);
    await waitFor(async () => (await findMap(planner.actor, id)).tilesDone > 0);
    expect(await worker.stop()).toBe(0);
    expect(worker.messages.at(-1)).toBe('worker stopped');
    const states = new Set((await jobsOf(id)).map(({ state }) => state));
    // Nothing is left behind as if somebody were at it.
    expect(states).toEqual(new Set(['completed', 'created']));
  });

  it('fails a map whose question cannot be read, and a retry is refused', { timeout: 120_000 }, async () => {
    const map = await askQuickMap(330);
    await map.update({ input: { kernelVersion: 1, arm: 'none' } });
    await start();
    const failed = await waitForState(map.id, 'failed');
    expect(failed.failure).toBe('The stored question cannot be read. Ask for the map again.');
    await expect(retryMap(planner.actor, map.id)).rejects.toMatchObject({ code: 'map_outdated' });
  });

  it('fails a map in plain words when a tile has used up its tries', { timeout: 120_000 }, async () => {
    const map = await askQuickMap(340);
    // As pg-boss leaves a job whose worker was lost at every attempt.
    const data = { mapId: map.id, attempt: 1, index: 0 };
    const output = JSON.stringify({ value: { message: 'job failed by timeout in active state' } });
    await sequelize.query(`DELETE FROM ${QUEUE_SCHEMA}.job WHERE data ->> 'mapId' = $1`, { bind: [map.id] });
    await sequelize.transaction((transaction) =>
      enqueue({ ...mapTileJob, name: deadLetterOf(mapTileJob) }, data, { transaction }),
    );
    await sequelize.query(`UPDATE ${QUEUE_SCHEMA}.job SET output = $1::jsonb WHERE name = $2`, {
      bind: [output, deadLetterOf(mapTileJob)],
    });
    await start();
    const failed = await waitForState(map.id, 'failed');
    expect(failed.failure).toBe(
      'A part of the map could not be computed in several tries. The last one ended with: its worker was stopped, or took ' +
        'too long. Try again; if it fails again, tell your admin.',
    );
    await retryMap(planner.actor, map.id);
    expect(await waitForState(map.id, 'done')).toMatchObject({ attempt: 2, failure: null });
  });
});
