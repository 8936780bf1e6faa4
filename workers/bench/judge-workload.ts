import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import { rectangleOutline } from '@/lib/layout/geometry';
import { fixtureSchema, robotSchema, type Item } from '@/lib/layout/items';
import { makeCellJudge } from '@/lib/layout/verdicts';

/** Runs alike in Node and in a browser page: no import of either. */

const ROBOTS = 4;
const FIXTURES = 6;
const POINTS_EACH = 10;
const MOVE_MM = 10;

const idOf = (digit: number): string => `00000000-0000-4000-8000-${String(digit).padStart(12, '0')}`;
const { arm } = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-12kg')!;

/** Four six-axis arms face to face over six fixtures with ten task points each. */
export function judgedCell(): Item[] {
  const robots = Array.from({ length: ROBOTS }, (_, k) =>
    robotSchema.parse({
      kind: 'robot',
      id: idOf(k),
      name: `R${k + 1}`,
      xMm: (k % 2) * 2600,
      yMm: Math.floor(k / 2) * 2200,
      angleDeg: (k % 2) * 180,
      armId: idOf(90),
      riserMm: 350,
      tool: { zMm: 180, massKg: 2.4 },
    }),
  );
  const fixtures = Array.from({ length: FIXTURES }, (_, f) =>
    fixtureSchema.parse({
      kind: 'fixture',
      id: idOf(100 + f),
      name: `Fixture ${f + 1}`,
      xMm: 700 + (f % 3) * 600,
      yMm: 400 + Math.floor(f / 3) * 1300,
      angleDeg: 7 * f,
      outlineMm: rectangleOutline(500, 500),
      zToMm: 800,
      taskPoints: Array.from({ length: POINTS_EACH }, (_, p) => ({
        id: idOf(1000 + POINTS_EACH * f + p),
        name: `P${p + 1}`,
        xMm: -200 + (p % 5) * 100,
        yMm: -150 + Math.floor(p / 5) * 300,
        zMm: 850,
        speedMmS: 300,
        tiltDeg: (p % 3) * 15,
      })),
    }),
  );
  return [...robots, ...fixtures];
}

/** Milliseconds that judging takes after each move of one item; `from scratch` judges everything each time. */
export function judgeTimes(dragged: 'robot' | 'fixture' | 'from scratch', moves: number): number[] {
  let items = judgedCell();
  let judge = makeCellJudge();
  const moved = items.findIndex(({ kind }) => kind === (dragged === 'fixture' ? 'fixture' : 'robot'));
  const times: number[] = [];
  judge(items, () => arm, 'held');
  for (let move = 0; move < moves; move++) {
    const by = MOVE_MM * (1 + (move % 20));
    items = items.map((item, index) => (index === moved ? { ...item, xMm: item.xMm + (move % 2 ? -by : by) } : item));
    if (dragged === 'from scratch') judge = makeCellJudge();
    const start = performance.now();
    const { points } = judge(items, () => arm, 'held');
    times.push(performance.now() - start);
    if (points.length !== FIXTURES * POINTS_EACH) throw new Error('Not every task point was judged.');
  }
  return times;
}
