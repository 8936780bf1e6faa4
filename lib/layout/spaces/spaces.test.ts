import { describe, expect, it } from 'vitest';
import { compileChain, skeleton } from '@/lib/kinematics/chain';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import { scara } from '@/lib/kinematics/library/scara';
import { liesInside } from '../clearance/plane';
import { estimatedLinkRadius } from '../clearance/links';
import { itemToFloor, polygonAreaMm2, type PointMm } from '../geometry';
import { robotSchema } from '../items';
import { armWithTool } from '../robot-frame';
import { spaceToLine } from './guard-distance';
import { convexOverlap, overlapAreaM2 } from './overlap';
import { maximumSpace, operatingSpace, restrictedSpace, withStops } from './spaces';

const six = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-6kg')!.arm;
const robot = (more: object = {}) =>
  robotSchema.parse({
    kind: 'robot',
    id: '00000000-0000-4000-8000-0000000000d2',
    name: 'R1',
    xMm: 1000,
    yMm: -400,
    angleDeg: 30,
    armId: '00000000-0000-4000-8000-0000000000aa',
    tool: { zMm: 120, radiusMm: 80 },
    ...more,
  });

/** A fixed scatter over the joints' ranges: additive recurrence with square roots of primes (Weyl 1916). */
function scatter(arm: typeof six, count: number): number[][] {
  return Array.from({ length: count }, (_, k) =>
    arm.joints.map(({ min, max }, j) => min + ((k * Math.sqrt([2, 3, 5, 7, 11, 13][j])) % 1) * (max - min)),
  );
}

const farthestOut = (outline: readonly PointMm[], [x, y]: PointMm) => (liesInside(outline, x, y) ? 0 : 1);

describe('spaces hold every posture that they are said to hold', () => {
  it('maximum', () => {
    const { outlineMm } = maximumSpace(robot(), six, 900);
    const chain = compileChain(armWithTool(six, robot().tool));
    for (const posture of scatter(six, 2000))
      for (const [x, y] of skeleton(chain, posture))
        expect(farthestOut(outlineMm, itemToFloor(robot(), [x * 1000, y * 1000]))).toBe(0);
  });

  it('restricted, which is smaller', () => {
    const jointStops = [
      { joint: 1, min: -45, max: 45 },
      { joint: 2, min: -20, max: 60 },
    ];
    const stopped = robot({ jointStops });
    const { outlineMm } = restrictedSpace(stopped, six, 900);
    const chain = compileChain(armWithTool(six, stopped.tool));
    for (const posture of scatter(withStops(six, jointStops), 3000))
      for (const [x, y] of skeleton(chain, posture))
        expect(farthestOut(outlineMm, itemToFloor(stopped, [x * 1000, y * 1000]))).toBe(0);
    expect(polygonAreaMm2(outlineMm)).toBeLessThan(0.9 * polygonAreaMm2(maximumSpace(stopped, six, 900).outlineMm));
  });

  it('operating, and no more than that', () => {
    const postures = scatter(six, 5);
    const space = operatingSpace(robot(), six, 900, postures)!;
    const chain = compileChain(armWithTool(six, robot().tool));
    const points = postures.flatMap((posture) => skeleton(chain, posture));
    for (const [x, y] of points)
      expect(farthestOut(space.outlineMm, itemToFloor(robot(), [x * 1000, y * 1000]))).toBe(0);
    const reach = Math.max(...points.map(([x, y]) => Math.hypot(x, y))) * 1000;
    const far = Math.max(...space.outlineMm.map(([x, y]) => Math.hypot(x - 1000, y + 400)));
    // The radius is added, and a corner between two directions 10° apart stands out by 1 / cos 5°.
    expect(far).toBeLessThanOrEqual((reach + 80) / Math.cos((5 * Math.PI) / 180) + 1e-6);
    expect(operatingSpace(robot(), six, 900, [])).toBeNull();
  });

  it('restricted is told by hand for two links that only swing a quarter turn', () => {
    // Straight arm of 0.4 + 0.3 m, first joint 0 … 90°, second fixed: along +x it reaches 0.7 m, along −x only the base stands.
    const limits = [[0, 90], [-1e-6, 1e-6], [-90, 90]] as const; // prettier-ignore
    const arm = scara({
      innerLink: 0.4,
      outerLink: 0.3,
      column: 0.3,
      stroke: 0.2,
      limits: [[-170, 170], [-150, 150], [-90, 90]],
      speeds: [300, 400, 700],
      ramps: [1500, 2000, 4000],
      quillSpeed: 1,
      quillRamp: 10,
    }); // prettier-ignore
    const jointStops = limits.slice(0, 2).map(([min, max], index) => ({ joint: index + 1, min, max }));
    const stopped = robot({ xMm: 0, yMm: 0, angleDeg: 0, tool: { zMm: 0 }, jointStops });
    const { outlineMm } = restrictedSpace(stopped, arm, 700);
    const link = estimatedLinkRadius(700) * 1000;
    const xs = outlineMm.map(([x]) => x);
    expect(Math.max(...xs)).toBeCloseTo(700 + link, 0);
    expect(Math.min(...xs)).toBeCloseTo(-link, 0);
  });
});

describe('shared floor', () => {
  it('of two discs has the area of the lens', () => {
    const disc = (x: number): PointMm[] =>
      Array.from({ length: 720 }, (_, k) => [
        x + 1200 * Math.cos((k * Math.PI) / 360),
        1200 * Math.sin((k * Math.PI) / 360),
      ]);
    // Plane geometry: 2 r² acos(d / 2r) − d/2 √(4r² − d²) = 0.360124 m² for r = 1.2 m, d = 2 m.
    expect(overlapAreaM2(convexOverlap(disc(0), disc(2000)))).toBeCloseTo(0.360124, 3);
    expect(convexOverlap(disc(0), disc(2500))).toEqual([]);
  });
});

describe('a space against a guard line', () => {
  const square = (half: number, x = 0): PointMm[] => [[x - half, -half], [x + half, -half], [x + half, half], [x - half, half]]; // prettier-ignore

  it('is told by its least distance while it stays inside', () => {
    expect(spaceToLine(square(500), square(800), true)).toEqual({ distanceMm: 300, pastMm: 0 });
  });

  it('is told by how far it reaches past', () => {
    expect(spaceToLine(square(500, 600), square(800), true)).toEqual({ distanceMm: 0, pastMm: 300 });
    expect(spaceToLine(square(100, 2000), square(800), true)).toEqual({ distanceMm: 0, pastMm: 1300 });
  });

  it('of an open line is told by distance alone', () => {
    expect(spaceToLine(square(500), [[900, -1000], [900, 1000]], false)).toEqual({ distanceMm: 400, pastMm: 0 }); // prettier-ignore
  });
});
