import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import type { Arm } from '@/lib/kinematics/types';
import { robotSchema } from '@/lib/layout/items';
import { mapSettingsSchema } from '@/lib/layout/map-settings';
import { plumbOnFloor, readPlumb } from './plumb';
import { ARC_MINUTE_RAD, coverageAt, plumbFigures } from './plumb-figures';

const ID = '00000000-0000-4000-8000-000000000001';
const robotAt = (angleDeg: number) =>
  robotSchema.parse({ kind: 'robot', id: ID, name: 'R1', xMm: 0, yMm: 0, angleDeg, armId: ID });
const settings = (patch: object = {}) => mapSettingsSchema.parse(patch);
const read = (arm: Arm, angleDeg: number, spot: { xMm: number; yMm: number }, patch: object = {}) =>
  readPlumb(robotAt(angleDeg), arm, plumbOnFloor(spot, settings(patch)), settings(patch));

/** Two links of 0.5 and 0.4 m in the plane, elbow at 60°, 180 and 300 °/s: the flat arm of the published figures. */
const flat: Arm = {
  convention: 'standard',
  freedoms: ['x', 'y'],
  joints: [
    [0.5, Math.PI],
    [0.4, (300 / 180) * Math.PI],
  ].map(([a, maxSpeed]) => ({
    type: 'revolute' as const,
    a,
    alpha: 0,
    d: 0,
    theta: 0,
    min: -3,
    max: 3,
    maxSpeed,
    maxAcceleration: 10,
  })),
};

function bent(angleDeg: number) {
  const { arm } = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-12kg')!;
  const reading = read(arm, angleDeg, { xMm: 500, yMm: 500 });
  const posture = { ...reading.postures[0], joints: [0, Math.PI / 3] };
  return { reading: { ...reading, arm: flat }, posture };
}

describe('what the plumb tells of one posture', () => {
  // Gains of the planar arm with speeds 180 and 300 °/s at (0°, 60°): 3.091543 and 0.921582 m/s, by hand from its 2 × 2 matrix.
  it('has the gains and directions of the flat arm, on the floor', () => {
    const headings = [0, 50].map((angleDeg) => {
      const { reading, posture } = bent(angleDeg);
      const { principal, stillCount, poseCondition } = plumbFigures(reading, posture, 'free');
      expect(principal.map(({ gain }) => gain)).toEqual([expect.closeTo(3.091543, 4), expect.closeTo(0.921582, 4)]);
      const between = Math.abs(principal[0].headingDeg! - principal[1].headingDeg!) % 180;
      expect(between).toBeCloseTo(90, 3);
      expect(principal.every(({ riseDeg }) => Math.abs(riseDeg) < 1e-6)).toBe(true);
      expect([stillCount, poseCondition]).toEqual([0, null]);
      return principal[0].headingDeg!;
    });
    // A base that is turned turns its directions with it; a direction and its opposite are one.
    expect((((headings[1] - headings[0] - 50) % 180) + 180) % 180).toBeCloseTo(0, 6);
  });

  // First-order error of that arm: columns (−0.346410, 0.7) and (−0.346410, 0.2) m; both against us they add up.
  it('states the error of a minute of arc a joint', () => {
    const { reading, posture } = bent(0);
    const { error } = plumbFigures(reading, posture, 'free');
    const worst = Math.hypot(0.69282, 0.9) * ARC_MINUTE_RAD * 1000;
    expect(error.worstMm).toBeCloseTo(worst, 4);
    // The largest singular value of the same arm unscaled: 0.853720.
    expect(error.rootSumSquareMm).toBeCloseTo(0.85372 * ARC_MINUTE_RAD * 1000, 5);
  });

  it('counts the one motion that a seven-axis arm has to spare', () => {
    const { arm } = BUILT_IN_ARMS.find(({ slug }) => slug === 'seven-axis-9kg')!;
    const reading = read(arm, 0, { xMm: 450, yMm: 100 }, { toolHeightMm: 300, rollDeg: 0 });
    const { stillCount, poseCondition } = plumbFigures(reading, reading.postures[0], 'held');
    expect(stillCount).toBe(1);
    expect(poseCondition!.inverse).toBeGreaterThan(0);
  });

  it('covers all directions in the open and none out of reach', () => {
    const { arm } = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-12kg')!;
    const shareAt = (xMm: number) => {
      const steps = [...coverageAt(read(arm, 0, { xMm, yMm: 0 }, { toolHeightMm: 600 }))];
      expect(steps).toHaveLength(96);
      return steps[95].reached / 96;
    };
    expect(shareAt(4000)).toBe(0);
    expect(shareAt(800)).toBeGreaterThan(0.5);
    expect(shareAt(1350)).toBeLessThan(shareAt(800));
  });
});
