import { describe, expect, it } from 'vitest';
import { Autosave, type SendAnswer } from './autosave';
import { readKept, settleKept } from './kept-edits';
import { same } from './same';
import { Sheet } from './sheet';
import { FakeLayoutServer } from './testing/fake-layout-server';
import { randomEdit } from './testing/random-edits';
import { seeded, type Seeded } from './testing/seeded';

/** One person at a sheet: edits, a line that fails now and then, reloads, and a decision for every conflict. */
class Planner {
  sheet!: Sheet;
  autosave!: Autosave;
  private kept: string | null = null;
  private due: (() => void)[] = [];

  constructor(
    private readonly server: FakeLayoutServer,
    private readonly random: Seeded,
    private readonly lossShare: { value: number },
  ) {
    this.open([]);
  }

  private open(edits: Parameters<typeof settleKept>[0]['edits']): void {
    const { version, items } = this.server;
    this.sheet = new Sheet({ layoutVersion: version, items, edits }, this.random.id);
    this.autosave = new Autosave(this.sheet, {
      send: (batch) => this.send(batch),
      keep: (edits) => (this.kept = edits && JSON.stringify(edits)),
      newId: this.random.id,
      timer: (action) => {
        this.due.push(action);
        return () => (this.due = this.due.filter((entry) => entry !== action));
      },
    });
  }

  private async send(batch: Parameters<FakeLayoutServer['take']>[0]): Promise<SendAnswer> {
    if (this.random.chance(this.lossShare.value)) return { kind: 'unreachable', message: 'No line.' };
    const answer = this.server.take(structuredClone(batch));
    // Applied, but the answer never arrives.
    if (this.random.chance(this.lossShare.value)) return { kind: 'unreachable', message: 'No line.' };
    return answer;
  }

  async reload(): Promise<void> {
    const kept = readKept(this.kept);
    const edits = kept ? await settleKept(kept, (batch) => this.send(batch)) : [];
    if (!edits) return; // The line is down: the page cannot be loaded either.
    this.autosave.stop();
    this.due = [];
    this.open(edits);
  }

  async runTimers(): Promise<void> {
    const now = this.due;
    this.due = [];
    for (const action of now) action();
    await new Promise((resolve) => setImmediate(resolve));
  }

  poll(): void {
    const { sync } = this.sheet.getState();
    if (!sync.inFlight) this.sheet.merge(this.server.changes(sync.layoutVersion));
  }

  decideAll(): void {
    for (const { itemId } of this.sheet.getState().sync.conflicts) {
      this.sheet.decide(itemId, this.random.chance(0.5) ? 'mine' : 'theirs');
    }
  }
}

async function history(seed: number): Promise<{ server: FakeLayoutServer; planners: Planner[] }> {
  const random = seeded(seed);
  const server = new FakeLayoutServer();
  const loss = { value: 0.15 };
  const planners = [new Planner(server, random, loss), new Planner(server, random, loss)];
  const left = [50, 50];
  while (left.some((count) => count > 0)) {
    const who = random.below(2);
    const planner = planners[who];
    const turn = random.below(10);
    if (turn < 5 && left[who] > 0 && randomEdit(random, planner.sheet)) left[who] -= 1;
    else if (turn === 5) planner.sheet.undo();
    else if (turn === 6) planner.poll();
    else if (turn === 7) planner.decideAll();
    else if (turn === 8 && random.chance(0.2)) await planner.reload();
    else await planner.runTimers();
  }
  loss.value = 0;
  for (let round = 0; round < 30; round += 1) {
    for (const planner of planners) {
      planner.poll();
      planner.decideAll();
      await planner.runTimers();
    }
  }
  return { server, planners };
}

describe('two planners on one sheet', () => {
  it('never lose an edit that the server took, over 500 seeded histories of 2 × 50 operations', async () => {
    for (let seed = 1; seed <= 500; seed += 1) {
      const { server, planners } = await history(seed);
      const stored = new Map(server.items.map(({ item }) => [item.id, item]));
      for (const { sheet, autosave } of planners) {
        expect(autosave.getStatus(), `seed ${seed}`).toEqual({ state: 'saved', detail: null });
        // Compared by our own hand: the matcher's comparison of 500 pairs of sheets would take most of the test's time.
        const shown = Object.fromEntries(sheet.getState().items);
        expect(same(shown, Object.fromEntries(stored)), `seed ${seed}`).toBe(true);
      }
      // Each accepted edit was made knowing the one before it: versions of an item follow one another without a gap.
      const versions = new Map<string, number>();
      for (const { itemId, baseVersion, version } of server.accepted) {
        const before = versions.get(itemId) ?? 0;
        expect(version, `seed ${seed}`).toBe(before + 1);
        expect([0, before], `seed ${seed}`).toContain(baseVersion);
        versions.set(itemId, version);
      }
    }
  }, 120_000);
});
