import { beforeEach, describe, expect, it } from 'vitest';
import type { OperationBatch } from '@/lib/contracts/layouts';
import type { Item } from '@/lib/layout/items';
import { Autosave, type SendAnswer } from './autosave';
import { readKept, settleKept } from './kept-edits';
import { newBlock } from './make-items';
import { Sheet } from './sheet';
import { FakeLayoutServer } from './testing/fake-layout-server';
import { seeded } from './testing/seeded';

const random = seeded(41);
const block = (name: string): Item => ({
  ...newBlock(new Map(), 'obstacle', { id: random.id(), xMm: 0, yMm: 0 }),
  name,
});

/** A sheet on a server of its own, with a line that can be cut and timers that run when told to. */
function bench() {
  const server = new FakeLayoutServer();
  const sent: OperationBatch[] = [];
  const timers: { action: () => void; afterMs: number }[] = [];
  const line = { state: 'up' as 'up' | 'down' | 'answer lost', refusal: null as string | null };
  let kept: string | null = null;
  const send = async (batch: OperationBatch): Promise<SendAnswer> => {
    sent.push(structuredClone(batch));
    if (line.refusal) return { kind: 'refused', message: line.refusal };
    if (line.state === 'down') return { kind: 'unreachable', message: 'No line.' };
    const answer = server.take(structuredClone(batch));
    return line.state === 'up' ? answer : { kind: 'unreachable', message: 'No line.' };
  };
  const sheet = new Sheet({ layoutVersion: 1, items: [] }, random.id);
  const autosave = new Autosave(sheet, {
    send,
    keep: (edits) => (kept = edits && JSON.stringify(edits)),
    newId: random.id,
    timer: (action, afterMs) => {
      const entry = { action, afterMs };
      timers.push(entry);
      return () => void timers.splice(timers.indexOf(entry), 1);
    },
  });
  const runTimers = async () => {
    for (const { action } of timers.splice(0)) action();
    await new Promise((resolve) => setImmediate(resolve));
  };
  const add = (item: Item) => sheet.commit('Place', [{ itemId: item.id, before: null, after: item }]);
  return { server, sheet, autosave, sent, timers, line, send, runTimers, add, kept: () => readKept(kept) };
}

let at: ReturnType<typeof bench>;
beforeEach(() => (at = bench()));

describe('autosave', () => {
  it('gathers edits in quick succession into one batch and says so', async () => {
    at.add(block('One'));
    at.add(block('Two'));
    expect(at.autosave.getStatus().state).toBe('saving');
    expect(at.sent).toHaveLength(0);
    await at.runTimers();
    expect(at.sent).toHaveLength(1);
    expect(at.server.items.map(({ item }) => item.name)).toEqual(['One', 'Two']);
    expect(at.autosave.getStatus()).toEqual({ state: 'saved', detail: null });
    expect(at.kept()).toBeNull();
  });

  it('sends nothing for an edit that was undone before it went out', async () => {
    at.add(block('One'));
    at.sheet.undo();
    await at.runTimers();
    expect(at.sent).toHaveLength(0);
    expect(at.autosave.getStatus().state).toBe('saved');
  });

  it('leaves undo and redo as they were, and saves what they do', async () => {
    at.add(block('One'));
    await at.runTimers();
    at.add(block('Two'));
    await at.runTimers();
    at.sheet.undo();
    at.sheet.undo();
    at.sheet.redo();
    await at.runTimers();
    expect(at.server.items.map(({ item }) => item.name)).toEqual(['One']);
    expect(at.autosave.getStatus().state).toBe('saved');
    at.sheet.redo();
    await at.runTimers();
    expect(at.server.items.map(({ item }) => item.name)).toEqual(['One', 'Two']);
  });

  it('sends a batch without an answer again under the same id, and later edits after it', async () => {
    at.line.state = 'answer lost';
    at.add(block('One'));
    await at.runTimers();
    expect(at.autosave.getStatus()).toEqual({ state: 'offline', detail: 'No line.' });
    at.add(block('Two'));
    await at.runTimers();
    expect(new Set(at.sent.map(({ id }) => id)).size).toBe(1);
    at.line.state = 'up';
    await at.runTimers();
    await at.runTimers();
    expect(at.server.accepted).toHaveLength(2);
    expect(at.server.items.map(({ item }) => item.name)).toEqual(['One', 'Two']);
    expect(at.autosave.getStatus().state).toBe('saved');
  });

  it('waits longer after each failure, up to half a minute, and tries at once when woken', async () => {
    at.line.state = 'down';
    at.add(block('One'));
    const waits: number[] = [];
    for (let count = 0; count < 8; count += 1) {
      waits.push(at.timers[0].afterMs);
      await at.runTimers();
    }
    expect(waits).toEqual([500, 1000, 2000, 4000, 8000, 16000, 30000, 30000]);
    at.line.state = 'up';
    at.autosave.wake();
    await new Promise((resolve) => setImmediate(resolve));
    expect(at.autosave.getStatus().state).toBe('saved');
  });

  it('turns a stale answer into a conflict and saves what is decided', async () => {
    const item = block('Mine');
    at.add(item);
    await at.runTimers();
    at.server.take({
      id: random.id(),
      operations: [{ type: 'put', baseVersion: 1, item: { ...item, name: 'Theirs' } }],
    });
    at.sheet.commit('Move', [{ itemId: item.id, before: item, after: { ...item, xMm: 500 } }]);
    await at.runTimers();
    expect(at.autosave.getStatus().state).toBe('conflict');
    expect(at.sheet.getState().sync.conflicts).toMatchObject([{ itemId: item.id, theirs: { version: 2 } }]);
    expect(at.kept()?.edits).toHaveLength(1);
    at.sheet.decide(item.id, 'mine');
    await at.runTimers();
    expect(at.server.items[0]).toMatchObject({ version: 3, item: { name: 'Mine', xMm: 500 } });
    expect(at.autosave.getStatus().state).toBe('saved');
  });

  it('takes theirs where that is chosen', async () => {
    const item = block('Mine');
    at.add(item);
    await at.runTimers();
    at.server.take({ id: random.id(), operations: [{ type: 'remove', baseVersion: 1, itemId: item.id }] });
    at.sheet.commit('Move', [{ itemId: item.id, before: item, after: { ...item, xMm: 500 } }]);
    await at.runTimers();
    at.sheet.decide(item.id, 'theirs');
    expect(at.sheet.getState().items.size).toBe(0);
    expect(at.autosave.getStatus().state).toBe('saved');
  });

  it('keeps a refused edit on the sheet, says why, and tries again after the next edit', async () => {
    at.line.refusal = 'The sheet is archived.';
    const item = block('One');
    at.add(item);
    await at.runTimers();
    expect(at.autosave.getStatus()).toEqual({ state: 'refused', detail: 'The sheet is archived.' });
    expect(at.timers).toHaveLength(0);
    expect(at.kept()?.edits).toHaveLength(1);
    at.line.refusal = null;
    at.add(block('Two'));
    await at.runTimers();
    expect(at.server.items).toHaveLength(2);
  });
});

describe('edits kept over a reload', () => {
  const reopen = async () => {
    const kept = at.kept();
    const edits = kept && (await settleKept(kept, at.send));
    return edits && new Sheet({ layoutVersion: at.server.version, items: at.server.items, edits }, random.id);
  };

  it('bring back what was never sent', async () => {
    at.add(block('One'));
    const sheet = await reopen();
    expect([...(sheet?.getState().items.values() ?? [])].map(({ name }) => name)).toEqual(['One']);
    expect(sheet?.getState().sync.conflicts).toEqual([]);
  });

  it('are not doubled by a batch whose answer was lost, and keep a removal made after it', async () => {
    at.line.state = 'answer lost';
    const [one, two] = [block('One'), block('Two')];
    at.add(one);
    at.add(two);
    await at.runTimers();
    at.sheet.commit('Delete', [{ itemId: one.id, before: one, after: null }]);
    at.line.state = 'up';
    const sheet = await reopen();
    expect([...(sheet?.getState().items.keys() ?? [])]).toEqual([two.id]);
    expect(sheet?.getState().sync.conflicts).toEqual([]);
    expect(at.server.accepted).toHaveLength(2);
  });

  it('wait while the server cannot be reached', async () => {
    at.line.state = 'down';
    at.add(block('One'));
    await at.runTimers();
    expect(await reopen()).toBeNull();
    expect(at.kept()?.inFlight?.operations).toHaveLength(1);
  });

  it('stand as a conflict where a colleague was faster', async () => {
    const item = block('One');
    at.add(item);
    await at.runTimers();
    at.sheet.commit('Move', [{ itemId: item.id, before: item, after: { ...item, xMm: 500 } }]);
    at.server.take({
      id: random.id(),
      operations: [{ type: 'put', baseVersion: 1, item: { ...item, name: 'Theirs' } }],
    });
    const sheet = await reopen();
    expect(sheet?.getState().items.get(item.id)).toMatchObject({ xMm: 500, name: 'One' });
    expect(sheet?.getState().sync.conflicts).toMatchObject([{ theirs: { item: { name: 'Theirs' } } }]);
  });

  it('are nothing where what was kept cannot be read', () => {
    expect(readKept('{"edits": [{"type": "put"}]}')).toBeNull();
    expect(readKept('not json')).toBeNull();
  });
});
