import { beforeEach, describe, expect, it } from 'vitest';
import type { DexterityMap } from '@/lib/contracts/maps';
import { makeMapTile } from '@/lib/kinematics/maps/tile-codec';
import { robotSchema } from '@/lib/layout/items';
import { questionOfRobot } from '@/lib/layout/map-question';
import type { MapQuestion } from '@/lib/layout/map-question-schema';
import { mapSettingsSchema } from '@/lib/layout/map-settings';
import { keyOf, MapBook } from './map-book';

const ARM = '00000000-0000-4000-8000-000000000070';
const settings = mapSettingsSchema.parse({});
const robotAt = (xMm: number, riserMm = 0) =>
  robotSchema.parse({ kind: 'robot', id: ARM, name: 'R1', armId: ARM, xMm, yMm: 0, angleDeg: 0, riserMm });
const question = questionOfRobot(robotAt(0), settings);

function mapIn(state: DexterityMap['state'], done = 0): DexterityMap {
  return {
    id: ARM,
    key: 'a'.repeat(64),
    state,
    progress: { done, total: 4 },
    failure: state === 'failed' ? 'The arm has no such joint.' : null,
    grid: { originMm: [0, 0], stepMm: 25, columns: 2, rows: 3 },
    summary: null,
    askedAt: '2031-05-04T08:00:00.000Z',
    finishedAt: null,
  };
}

/** A book on a server that answers what is laid ready, with timers that run when told to. */
function bench() {
  const asked: MapQuestion[] = [];
  const commands: string[] = [];
  const answers: (DexterityMap | Error)[] = [];
  const timers: { action: () => void; afterMs: number }[] = [];
  const next = async () => {
    const answer = answers.shift();
    if (!answer) throw new Error('Nothing was laid ready.');
    if (answer instanceof Error) throw answer;
    return answer;
  };
  const named = (name: string) => async () => {
    commands.push(name);
    return next();
  };
  const book = new MapBook({
    ask: async (one) => {
      asked.push(one);
      return next();
    },
    look: next,
    fetchTile: async ({ grid }) => makeMapTile(0, grid.rows, grid.columns),
    cancel: named('cancel'),
    retry: named('retry'),
    judge: (error) => ({ passing: String(error).includes('line'), words: String(error) }),
    timer: (action, afterMs) => {
      const entry = { action, afterMs };
      timers.push(entry);
      return () => void (timers.includes(entry) && timers.splice(timers.indexOf(entry), 1));
    },
  });
  const settle = () => new Promise((resolve) => setImmediate(resolve));
  const runTimers = async () => {
    for (const { action } of timers.splice(0)) action();
    await settle();
  };
  const entry = (of = question) => book.getEntries().get(keyOf(of));
  return { book, asked, commands, answers, timers, settle, runTimers, entry };
}

let at: ReturnType<typeof bench>;
beforeEach(() => (at = bench()));

describe('the maps of a sheet', () => {
  it('come at once where the store has them', async () => {
    at.answers.push(mapIn('done', 4));
    at.book.want([question]);
    await at.settle();
    expect(at.entry()).toMatchObject({ state: 'ready', tile: { rowTo: 3, columns: 2 } });
    expect(at.timers).toHaveLength(0);
  });

  it('ask nothing new for a base that moved, and one question for two robots alike', async () => {
    at.answers.push(mapIn('done', 4));
    at.book.want([question]);
    await at.settle();
    at.book.want([questionOfRobot(robotAt(4000), settings), questionOfRobot(robotAt(-900), settings)]);
    await at.settle();
    expect(at.asked).toHaveLength(1);
    at.answers.push(mapIn('queued'));
    at.book.want([questionOfRobot(robotAt(4000, 350), settings)]);
    expect(at.asked).toHaveLength(2);
  });

  it('are looked for more and more rarely while they are computed, and fetched when done', async () => {
    at.answers.push(mapIn('queued'), mapIn('running', 1), mapIn('running', 2), mapIn('done', 4));
    at.book.want([question]);
    await at.settle();
    const waits: number[] = [];
    while (at.timers.length > 0) {
      waits.push(at.timers[0].afterMs);
      await at.runTimers();
    }
    expect(waits).toEqual([300, 450, 675]);
    expect(at.entry()?.state).toBe('ready');
  });

  it('are no longer followed once nobody wants them, and again when somebody does', async () => {
    at.answers.push(mapIn('running', 1));
    at.book.want([question]);
    await at.settle();
    at.book.want([]);
    expect(at.timers).toHaveLength(0);
    at.book.want([question]);
    expect(at.timers).toHaveLength(1);
    expect(at.asked).toHaveLength(1);
  });

  it('can be cancelled and asked for again', async () => {
    at.answers.push(mapIn('running', 1), mapIn('cancelled'), mapIn('queued'));
    at.book.want([question]);
    await at.settle();
    await at.book.cancel(keyOf(question));
    expect(at.entry()?.state).toBe('cancelled');
    await at.book.retry(keyOf(question));
    expect(at.entry()?.state).toBe('queued');
    expect(at.commands).toEqual(['cancel', 'retry']);
  });

  it('tell why they failed', async () => {
    at.answers.push(mapIn('failed'));
    at.book.want([question]);
    await at.settle();
    expect(at.entry()).toMatchObject({ state: 'failed', trouble: 'The arm has no such joint.' });
  });

  it('are asked for again by themselves when the line is down, but not when they are refused', async () => {
    at.answers.push(new Error('no line'), mapIn('done', 4));
    at.book.want([question]);
    await at.settle();
    expect(at.entry()?.state).toBe('unreachable');
    await at.runTimers();
    expect(at.entry()?.state).toBe('ready');

    const other = questionOfRobot(robotAt(0, 100), settings);
    at.answers.push(new Error('refused'));
    at.book.want([other]);
    await at.settle();
    expect(at.entry(other)).toMatchObject({ state: 'failed' });
    expect(at.timers).toHaveLength(0);
  });
});
