import { describe, expect, it } from 'vitest';
import { newBlock } from './make-items';
import { Sheet } from './sheet';
import { FakeLayoutServer } from './testing/fake-layout-server';
import { seeded } from './testing/seeded';
import { watchChanges } from './watch-changes';

const random = seeded(8);
const settle = () => new Promise((resolve) => setImmediate(resolve));

function bench() {
  const server = new FakeLayoutServer();
  const sheet = new Sheet({ layoutVersion: server.version, items: [] }, random.id);
  const timers: { action: () => void; afterMs: number }[] = [];
  const asked: number[] = [];
  const line = { down: false, during: () => {} };
  const end = watchChanges(sheet, {
    ask: async (since) => {
      asked.push(since);
      const changes = server.changes(since);
      line.during();
      return line.down ? null : changes;
    },
    timer: (action, afterMs) => {
      const entry = { action, afterMs };
      timers.push(entry);
      return () => void (timers.includes(entry) && timers.splice(timers.indexOf(entry), 1));
    },
    isAwake: () => true,
  });
  const turn = async () => {
    for (const { action } of timers.splice(0)) action();
    await settle();
  };
  return { server, sheet, timers, asked, line, end, turn };
}

const block = () => newBlock(new Map(), 'obstacle', { id: random.id(), xMm: 0, yMm: 0 });

describe('watching what others change', () => {
  it('takes it in and asks from there on', async () => {
    const at = bench();
    const item = block();
    at.server.take({ id: random.id(), operations: [{ type: 'put', baseVersion: 0, item }] });
    await at.turn();
    expect(at.sheet.getState().items.get(item.id)).toEqual(item);
    at.server.take({ id: random.id(), operations: [{ type: 'remove', baseVersion: 1, itemId: item.id }] });
    await at.turn();
    expect(at.sheet.getState().items.size).toBe(0);
    expect(at.asked).toEqual([1, 2]);
  });

  it('misses nothing that came in just before an own batch', async () => {
    const at = bench();
    const [mine, theirs] = [block(), block()];
    at.sheet.commit('Place', [{ itemId: mine.id, before: null, after: mine }]);
    const batch = at.sheet.depart(random.id());
    at.server.take({ id: random.id(), operations: [{ type: 'put', baseVersion: 0, item: theirs }] });
    const answer = batch && at.server.take(batch);
    if (answer?.kind === 'accepted') at.sheet.acknowledge(answer.result);
    await at.turn();
    expect([...at.sheet.getState().items.keys()].sort()).toEqual([mine.id, theirs.id].sort());
  });

  it('drops an answer that was overtaken by an own batch', async () => {
    const at = bench();
    const item = block();
    at.line.during = () => {
      at.sheet.commit('Place', [{ itemId: item.id, before: null, after: item }]);
      at.sheet.depart(random.id());
    };
    at.server.take({ id: random.id(), operations: [{ type: 'put', baseVersion: 0, item: block() }] });
    await at.turn();
    expect(at.sheet.getState().sync.layoutVersion).toBe(1);
    at.line.during = () => {};
    await at.turn();
    // With the batch still on its way nothing is asked at all.
    expect(at.asked).toHaveLength(1);
  });

  it('asks more rarely while the line is down, and ends when told to', async () => {
    const at = bench();
    at.line.down = true;
    await at.turn();
    await at.turn();
    expect(at.timers[0].afterMs).toBe(6000);
    at.end();
    expect(at.timers).toHaveLength(0);
  });
});
