import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import { computeMapTile } from '@/lib/kinematics/maps/compute-tile';
import type { Arm } from '@/lib/kinematics/types';
import { fixtureSchema, robotSchema, type Fixture, type Robot } from './items';
import { mapRequestOf, questionOfRobot } from './map-question';
import { mapSettingsSchema } from './map-settings';
import { verdictFigures } from './verdict-figures';
import { bandOf } from './verdict-words';
import { judgeItems, type PointVerdict } from './verdicts';

const sixAxis = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-12kg')!.arm;

const id = (digit: number): string => `00000000-0000-4000-8000-${String(digit).padStart(12, '0')}`;

function robot(change: object = {}): Robot {
  const placed = { xMm: 0, yMm: 0, angleDeg: 0 };
  return robotSchema.parse({ kind: 'robot', id: id(1), name: 'R1', armId: id(2), ...placed, ...change });
}

function fixture(points: object[], placed: object = {}): Fixture {
  return fixtureSchema.parse({
    kind: 'fixture',
    id: id(3),
    name: 'Fixture 1',
    xMm: 0,
    yMm: 0,
    angleDeg: 0,
    outlineMm: [
      [0, 0],
      [1, 0],
      [0, 1],
    ],
    zToMm: 800,
    taskPoints: points.map((point, index) => ({
      id: id(100 + index),
      yMm: 0,
      name: `P${index + 1}`,
      order: index,
      ...point,
    })),
    ...placed,
  });
}

function judgeOne(arm: Arm, point: object, change: { robot?: object; fixture?: object } = {}): PointVerdict {
  const items = [robot(change.robot), fixture([point], change.fixture)];
  return judgeItems(items, () => arm, 'held')[0];
}

/** Two links of 0.5 and 0.4 m, 180 and 300 °/s: the planar arm of the check values in KINEMATICS.md. */
const planar: Arm = {
  convention: 'standard',
  freedoms: ['x', 'y'],
  joints: [
    [0.5, Math.PI],
    [0.4, (300 * Math.PI) / 180],
  ].map(([a, maxSpeed]) => ({
    type: 'revolute',
    a,
    alpha: 0,
    d: 0,
    theta: 0,
    min: -Math.PI,
    max: Math.PI,
    maxSpeed,
    maxAcceleration: 10,
  })),
};

describe('a point that is reached', () => {
  // The tool point of the planar arm at (0°, 60°); its z axis is the joints' and points up.
  const point = { xMm: 700, yMm: 400 * Math.sin(Math.PI / 3), zMm: 0, tiltDeg: 180 };

  it('has the speeds and the condition of its posture', () => {
    const { best } = judgeOne(planar, { ...point, speedMmS: 1000 });
    // Gains 3.091543 and 0.921582 m/s, maximum 4.354378, sure 1.161166 (KINEMATICS.md, derived by hand there).
    expect(best).toMatchObject({ reached: true, met: true, band: 'roomy', reason: null });
    expect(best!.posture!.conditionNumber).toBeCloseTo(3.091543 / 0.921582, 5);
    expect(best!.posture!.maximumToolSpeedMmS).toBeCloseTo(4354.378, 3);
    expect(best!.posture!.sureSpeedMmS).toBeCloseTo(1161.166, 3);
    expect(best!.speedMarginMmS).toBeCloseTo(161.166, 3);
  });

  it('is not met where it is wanted faster, and says so', () => {
    const { best } = judgeOne(planar, { ...point, speedMmS: 1200 });
    expect(best).toMatchObject({ reached: true, met: false });
    expect(best!.reason).toMatch(/allows? 1161 mm\/s in every direction; 1200 mm\/s are wanted\./);
    expect(best!.speedMarginMmS).toBeCloseTo(-38.834, 3);
  });

  it('moves with its fixture and with the robot', () => {
    const straight = judgeOne(sixAxis, { xMm: 900, yMm: 200, zMm: 700, tiltDeg: 30, azimuthDeg: 20, rollDeg: 40 });
    const turned = judgeOne(
      sixAxis,
      { xMm: 900, yMm: 200, zMm: 700, tiltDeg: 30, azimuthDeg: 20, rollDeg: 40 },
      {
        robot: { xMm: 5000, yMm: -3000, angleDeg: 125, riserMm: 0 },
        fixture: { xMm: 5000, yMm: -3000, angleDeg: 125 },
      },
    );
    expect(straight.best!.reached).toBe(true);
    straight.best!.posture!.joints.forEach((value, joint) => {
      expect(turned.best!.posture!.joints[joint]).toBeCloseTo(value, 8);
    });
  });

  it('is valued as the map values the spot', () => {
    const settings = mapSettingsSchema.parse({ toolHeightMm: 850 });
    const placed = robot({ riserMm: 400, tool: { zMm: 120 } });
    const { arm, request } = mapRequestOf(questionOfRobot(placed, settings), sixAxis);
    for (const [x, y] of [
      [0.7, 0.1],
      [-0.4, 0.8],
      [0.2, -0.95],
      [1.1, 0.35],
    ]) {
      const cell = { ...request, grid: { ...request.grid, origin: [x, y] as const, columns: 1, rows: 1 } };
      const tile = computeMapTile(arm, cell, 0, 1);
      const items = [placed, fixture([{ xMm: x * 1000, yMm: y * 1000, zMm: 850 }])];
      const { best } = judgeItems(items, () => sixAxis, 'held')[0];
      expect(best!.posture!.inverseConditionNumber).toBeCloseTo(tile.inverseConditionNumber[0], 6);
      expect(best!.posture!.sureSpeedMmS / 1000).toBeCloseTo(tile.sureSpeed[0], 5);
    }
  });
});

describe('a point that is not reached', () => {
  const [first, upper, elbow, , , flange] = sixAxis.joints.map(({ a, d }) => ({ a, d }));
  const forearm = Math.hypot(elbow.a, sixAxis.joints[3].d);

  it('tells by how much it is too far', () => {
    // Tool level, at shoulder height: the arm is stretched straight out when shoulder offset, links and wrist add up.
    const farthest = first.a + upper.a + forearm + flange.d;
    const at = (beyondMm: number): PointVerdict =>
      judgeOne(
        sixAxis,
        {
          xMm: farthest * 1000 + beyondMm,
          yMm: 0,
          zMm: first.d * 1000 + 200,
          tiltDeg: 90,
          azimuthDeg: 0,
        },
        { robot: { riserMm: 200 } },
      );
    expect(at(62).best).toMatchObject({ reached: false, met: false, band: 'out', reason: 'Out of reach by 62 mm.' });
    expect(at(-5).best!.reached).toBe(true);
  });

  it('names the joint at its limit and how far it would have to go', () => {
    const narrow: Arm = {
      ...sixAxis,
      joints: sixAxis.joints.map((joint, index) => (index === 0 ? { ...joint, min: -0.2, max: Math.PI / 18 } : joint)),
    };
    // 30° to the side of a first joint that turns 10°.
    const [xMm, yMm] = [900 * Math.cos(Math.PI / 6), 900 * Math.sin(Math.PI / 6)];
    const { best } = judgeOne(narrow, { xMm, yMm, zMm: 600 });
    expect(best).toMatchObject({
      bindingJoint: 1,
      reason: 'Joint 1 is at its limit: it would have to go 20° farther.',
    });
  });
});

describe('several robots', () => {
  const near = robot({ id: id(11), xMm: -200 });
  const far = robot({ id: id(12), name: 'R2', xMm: 5000 });
  const points = fixture([
    { xMm: 700, zMm: 700, speedMmS: 50 },
    { xMm: 2200, zMm: 700 },
  ]);
  const verdicts = judgeItems([far, points, near], () => sixAxis, 'held');

  it('are all judged, in the order of the sheet, and the best one is named', () => {
    expect(verdicts.map(({ pointName }) => pointName)).toEqual(['P1', 'P2']);
    expect(verdicts[0].robots.map(({ robotId }) => robotId)).toEqual([far.id, near.id]);
    expect(verdicts[0].best).toMatchObject({ robotId: near.id, met: true });
    expect(verdicts[1].best).toMatchObject({ reached: false });
  });

  it('add up to the numbers of a variant', () => {
    const figures = verdictFigures(verdicts);
    const { posture, speedMarginMmS } = verdicts[0].best!;
    expect(figures).toEqual({
      points: 2,
      reached: 1,
      met: 1,
      worstInverseConditionNumber: posture!.inverseConditionNumber,
      worstPointId: id(100),
      slowestMarginMmS: speedMarginMmS,
      slowestPointId: id(100),
    });
  });

  it('may be none', () => {
    const [verdict] = judgeItems([points], () => sixAxis, 'held');
    expect(verdict).toMatchObject({ best: null, robots: [] });
    expect(verdictFigures([verdict])).toMatchObject({ points: 1, reached: 0, worstInverseConditionNumber: null });
  });
});

describe('bands of condition number', () => {
  it('are the house bands, the limits included', () => {
    // 3.4 counts as reasonable, 30 and 30,000 as close to singular (common practice, no source).
    expect([1, 3.4, 4, 4.01, 10, 10.01, 30, 30.01, 30_000, Infinity].map(bandOf)).toEqual([
      'roomy',
      'roomy',
      'roomy',
      'fair',
      'fair',
      'tight',
      'tight',
      'pinned',
      'pinned',
      'pinned',
    ]);
  });
});
