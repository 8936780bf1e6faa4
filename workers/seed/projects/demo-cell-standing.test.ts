import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import type { Item } from '@/lib/layout/items';
import { robotSizes } from '@/lib/layout/robot-sticks';
import { standingOfRobot, workOfRobot } from '@/lib/layout/standing/ask';
import { makeStandingComputer } from '@/lib/layout/standing/standing-map';
import { judgeItems } from '@/lib/layout/verdicts';
import { PLACES, pumpRobot, pumpStations } from './pump-line-items';

const ARM_ID = '00000000-0000-4000-8000-0000000000aa';
const arm = BUILT_IN_ARMS.find(({ name }) => name === 'Six-axis 12 kg, 1.4 m')!.arm;
const halfPlateMm = robotSizes(1400).baseRadiusMm;

/** Variant C of the demo: two robots, of which R1 does the infeed, the housing and one outfeed point. */
const r1 = pumpRobot('R1', ARM_ID, PLACES.r1);
const r2 = pumpRobot('R2', ARM_ID, PLACES.r2TurnedIn);
const items: Item[] = [r1, r2, ...pumpStations()];

const verdictsOf = (sheet: readonly Item[], robotId: string) =>
  new Map(
    judgeItems(sheet, () => arm, 'held').map((verdict) => [
      verdict.pointId,
      { best: verdict.best?.robotId, own: verdict.robots.find((robot) => robot.robotId === robotId)! },
    ]),
  );

describe("the standing map of the demo cell's first robot", () => {
  const asDrawn = verdictsOf(items, r1.id);
  const work = workOfRobot(
    items,
    r1.id,
    new Set([...asDrawn].filter(([, { best }]) => best === r1.id).map(([id]) => id)),
  );
  const options = { wrist: 'held', stepMm: 100, turns: 4, risersMm: [r1.riserMm], halfPlateMm } as const;
  const question = standingOfRobot(items, r1, arm, work, options);
  const computer = makeStandingComputer(question, arm);
  const { best, drawn } = computer.answer([computer.rows(0, question.grid.rows)]);

  it('finds a place that beats the drawn one', () => {
    expect(work.length).toBeGreaterThan(3);
    expect(drawn.worst).not.toBeNull();
    expect(best!.worst!).toBeGreaterThan(drawn.worst! * 1.02);
  });

  it('says of the drawn place what the verdicts say', () => {
    const own = work.map(({ id }) => asDrawn.get(id)!.own.posture!.inverseConditionNumber);
    expect(drawn.worst).toBe(Math.min(...own));
  });

  it('promises exactly the verdicts that the robot then gets', () => {
    const { xMm, yMm, angleDeg, riserMm } = best!;
    const moved = items.map((item) => (item.id === r1.id ? { ...r1, xMm, yMm, angleDeg, riserMm } : item));
    const after = verdictsOf(moved, r1.id);
    work.forEach(({ id }, index) => {
      const { band, met, reached, posture } = after.get(id)!.own;
      expect(best!.points[index]).toEqual({
        band,
        met,
        reached,
        inverseConditionNumber: posture!.inverseConditionNumber,
        sureSpeedMmS: posture!.sureSpeedMmS,
      });
    });
    expect(best!.metCount).toBe(work.length);
  });
});
