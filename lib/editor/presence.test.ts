import { describe, expect, it } from 'vitest';
import type { PresenceReport } from '@/lib/contracts/presence';
import { PresenceKeeper } from './presence';

const settle = () => new Promise((resolve) => setImmediate(resolve));
const OTHER = { seat: 'other', name: 'Ilse Varnholt', at: { xMm: 1, yMm: 2 }, itemIds: [] };

function bench() {
  const reports: PresenceReport[] = [];
  const waits: number[] = [];
  const versions: number[] = [];
  const line = { down: false, awake: true };
  let due: (() => void)[] = [];
  const keeper = new PresenceKeeper({
    report: async (report) => {
      reports.push(report);
      return line.down ? null : { layoutVersion: 7, others: [OTHER] };
    },
    timer: (action, afterMs) => {
      waits.push(afterMs);
      due.push(action);
      return () => (due = due.filter((entry) => entry !== action));
    },
    isAwake: () => line.awake,
    seat: 'mine',
    chosenIds: () => ['a'],
    onVersion: (version) => versions.push(version),
  });
  const turn = async () => {
    const now = due;
    due = [];
    for (const action of now) action();
    await settle();
  };
  return { keeper, reports, waits, versions, line, turn, due: () => due };
}

describe('being seen on a sheet', () => {
  it('says where the pointer is and what is chosen, and hears of the others and of newer versions', async () => {
    const { keeper, reports, versions, turn } = bench();
    keeper.pointAt({ xMm: 10, yMm: 20 });
    let told = 0;
    keeper.subscribe(() => (told += 1));
    await turn();
    await turn();
    expect(reports).toEqual([
      { seat: 'mine', at: { xMm: 10, yMm: 20 }, itemIds: ['a'] },
      { seat: 'mine', at: { xMm: 10, yMm: 20 }, itemIds: ['a'] },
    ]);
    expect(keeper.getOthers()).toEqual([OTHER]);
    expect([told, versions]).toEqual([1, [7, 7]]);
  });

  it('reports often enough for a cursor and an edit to come within two seconds', async () => {
    const { waits, turn } = bench();
    await turn();
    expect(waits[0]).toBe(0);
    // 500 ms until an edit is sent and this until a colleague hears of it.
    expect(waits[1] + 500).toBeLessThan(2000);
  });

  it('shows nobody while the line is down, and asks ever more rarely', async () => {
    const { keeper, line, waits, turn } = bench();
    await turn();
    line.down = true;
    await turn();
    await turn();
    expect(keeper.getOthers()).toEqual([]);
    expect(waits.at(-1)!).toBeGreaterThan(waits.at(-2)!);
    line.down = false;
    await turn();
    expect(waits.at(-1)).toBe(1000);
  });

  it('is nowhere once the pointer is farther off than a sheet goes', async () => {
    const { keeper, reports, turn } = bench();
    keeper.pointAt({ xMm: 2_000_000, yMm: 0 });
    await turn();
    expect(reports[0].at).toBe(null);
  });

  it('is silent on a hidden page, and gives its seat up when it ends', async () => {
    const { keeper, line, reports, turn, due } = bench();
    line.awake = false;
    await turn();
    expect(reports).toEqual([]);
    keeper.stop();
    keeper.stop();
    expect(reports).toEqual([{ seat: 'mine', at: null, itemIds: [], leaving: true }]);
    expect(due()).toEqual([]);
  });
});
