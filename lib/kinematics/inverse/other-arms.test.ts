import { describe, expect, it } from 'vitest';
import { limitMargin, withinLimits } from '../limits';
import { BUILT_IN_ARMS } from '../library';
import { reach } from '../reach';
import { makeSolver, type Solver } from '../solver';
import { RIGHT_ANGLE, sliding, turning } from '../testing/chains';
import { randomPosture, seededRandom } from '../testing/random';
import { missOf, poser, postureDistance } from '../testing/round-trip';
import type { Arm } from '../types';
import { cross, dot, length, minus, type Triple } from './lines';

const builtIn = (slug: string): Arm => BUILT_IN_ARMS.find((entry) => entry.slug === slug)!.arm;
const palletiser = builtIn('palletiser-130kg');
const gantry = builtIn('gantry-40kg');
const seven = builtIn('seven-axis-9kg');
const track = builtIn('track-six-axis-30kg');

const crooked: Pick<Arm, 'base' | 'tool'> = {
  base: { xyz: [0.3, -0.2, 0.5], rpy: [0.2, -0.3, 0.4] },
  tool: { xyz: [0.06, 0.03, 0.12], rpy: [0.5, -0.4, 0.3] },
};
const turned = (arm: Arm): Arm => ({ ...arm, ...crooked });

/** Axes of the shoulder tilted against the base, an elbow off the line, joints with offsets of their own. */
const offsetSeven: Arm = {
  convention: 'modified',
  joints: [
    turning({ a: 0, alpha: 0.4, d: 0.3 }, 2, 0.3),
    turning({ a: 0, alpha: -RIGHT_ANGLE, d: 0 }, 2, 0.5),
    turning({ a: 0, alpha: RIGHT_ANGLE, d: 0.35 }, 2, -0.2),
    turning({ a: 0.06, alpha: RIGHT_ANGLE, d: 0 }, 2, 0.7),
    turning({ a: -0.05, alpha: -RIGHT_ANGLE, d: 0.4 }, 2, 0.1),
    turning({ a: 0, alpha: RIGHT_ANGLE, d: 0 }, 2, -0.4),
    turning({ a: 0, alpha: -RIGHT_ANGLE, d: 0.1 }, 2, 0.2),
  ],
};
/** The parallelogram's elbow driven the other way round, the column tool off the arm's plane. */
const oddPalletiser: Arm = {
  convention: 'standard',
  joints: [
    turning({ a: 0.2, alpha: -RIGHT_ANGLE, d: 0.6 }, 2, 0.4),
    turning({ a: 0.8, alpha: 0, d: 0.05 }, 2, -0.3),
    turning({ a: 0.7, alpha: Math.PI, d: 0.04 }, 2, 0.2),
    turning({ a: 0.1, alpha: RIGHT_ANGLE, d: 0.03 }, 2, -0.1),
    turning({ a: 0, alpha: 0, d: 0.2 }, 2, 0.6),
  ],
  coupling: [
    [1, 0, 0, 0],
    [0, 1, 0, 0],
    [0, -1, 1, 0],
    [0, 0, 1, 0],
    [0, 0, 0, -1],
  ],
  actuators: [3, 2, 2, 6].map((end) => ({ min: -end, max: end, maxSpeed: 2, maxAcceleration: 5 })),
};
/** Slides askew. */
const skewGantry: Arm = {
  convention: 'standard',
  joints: [
    sliding({ a: 0.1, alpha: 1.2, d: 0 }),
    { ...sliding({ a: 0, alpha: 1.1, d: 0 }), theta: 0.8 },
    sliding({ a: 0, alpha: 0.3, d: 0.2 }),
    turning({ a: 0, alpha: RIGHT_ANGLE, d: 0 }),
    turning({ a: 0, alpha: -RIGHT_ANGLE, d: 0 }),
    turning({ a: 0, alpha: 0.2, d: 0.1 }),
  ],
};

describe.each([
  ['palletiser', 'palletiser', palletiser],
  ['palletiser, tilted base, crooked tool', 'palletiser', turned(palletiser)],
  ['palletiser, odd rows', 'palletiser', oddPalletiser],
  ['gantry', 'gantry', gantry],
  ['gantry, tilted base, crooked tool', 'gantry', turned(gantry)],
  ['gantry, slides askew', 'gantry', skewGantry],
])('%s', (_, method, arm) => {
  it('finds the posture that made the pose, and every solution makes the pose to 1e-9 inside all limits (2,000 poses)', () => {
    const solver = makeSolver(arm);
    expect(solver.method).toBe(method);
    const stand = poser(arm);
    const random = seededRandom(21);
    let worst = 0;
    let lost = 0;
    let made = 0;
    while (made < 2000) {
      const posture = randomPosture(solver.chain, random);
      // Under a coupling the actuators may stand well and a joint that they drive not.
      if (!withinLimits(solver.chain, posture)) continue;
      made++;
      const pose = stand(posture);
      const { postures } = reach(solver, { pose });
      if (!postures.some((found) => postureDistance(found.posture, posture) < 1e-7)) lost++;
      for (const found of postures) {
        worst = Math.max(worst, missOf(stand(found.posture), pose));
        expect(withinLimits(solver.chain, found.posture)).toBe(true);
      }
    }
    expect(lost).toBe(0);
    expect(worst).toBeLessThan(1e-9);
  });
});

describe.each([
  ['seven axes', 'arm angle', seven],
  ['seven axes, tilted base, crooked tool', 'arm angle', turned(seven)],
  ['seven axes, odd rows, offset elbow', 'arm angle', offsetSeven],
  ['six axes on a track', 'track', track],
  ['six axes on a track, tilted base, crooked tool', 'track', turned(track)],
])('%s', (_, method, arm) => {
  it('reaches the pose in the class that made it, and every solution makes the pose to 1e-9 inside all limits (200 poses)', () => {
    const solver = makeSolver(arm);
    expect(solver.method).toBe(method);
    const stand = poser(arm);
    const random = seededRandom(22);
    let worst = 0;
    let unreached = 0;
    for (let i = 0; i < 200; i++) {
      const pose = stand(randomPosture(solver.chain, random));
      const { reached, postures } = reach(solver, { pose });
      if (!reached) unreached++;
      for (const found of postures) {
        worst = Math.max(worst, missOf(stand(found.posture), pose));
        expect(withinLimits(solver.chain, found.posture)).toBe(true);
      }
    }
    expect(unreached).toBe(0);
    expect(worst).toBeLessThan(1e-9);
  });
});

/** Swing of the elbow about the line from shoulder to wrist, worked out from where the joints stand (both test arms have no base). */
function armAngleOf({ stance: { origins, axes } }: Solver): number {
  const point = (joint: number): Triple => [origins[3 * joint], origins[3 * joint + 1], origins[3 * joint + 2]];
  const along = minus(point(5), point(1));
  const line: Triple = [along[0] / length(along), along[1] / length(along), along[2] / length(along)];
  const across = cross(line, [axes[0], axes[1], axes[2]]);
  const elbow = minus(point(3), point(1));
  // Both seen along the line: the uppermost side is where axis 1 leans.
  const towards = dot(cross(line, elbow), across);
  return Math.atan2(dot(cross(across, cross(line, elbow)), line), towards);
}

describe('the family of a redundant chain', () => {
  it.each([
    ['seven axes', seven],
    ['seven axes, odd rows', offsetSeven],
  ])('%s: holds the very posture that made a pose, at its own arm angle (500 poses)', (_, arm) => {
    const solver = makeSolver(arm);
    const random = seededRandom(23);
    let worst = 0;
    for (let i = 0; i < 500; i++) {
      const posture = randomPosture(solver.chain, random);
      solver.stand(posture);
      const angle = armAngleOf(solver);
      const { count, values } = solver.closedForm!.solve(solver.flangeOf(solver.stance.tool), angle);
      let least = Infinity;
      for (let b = 0; b < count; b++) {
        const off = posture.map((q, j) => (values[7 * b + j] - q) / (2 * Math.PI));
        least = Math.min(least, 2 * Math.PI * Math.max(...off.map((turns) => Math.abs(turns - Math.round(turns)))));
      }
      worst = Math.max(worst, least);
    }
    expect(worst).toBeLessThan(1e-7);
  });

  it('lets an elbow swing while the tool stands still, as far as the joints go', () => {
    const solver = makeSolver(seven);
    const pose = poser(seven)([0.2, 0.6, 0.1, 1.2, -0.3, 0.9, 0.4]);
    const { postures } = reach(solver, { pose });
    const classes = new Map<string, number>();
    for (const { branch } of postures) classes.set(branch, (classes.get(branch) ?? 0) + 1);
    expect(Math.max(...classes.values())).toBeGreaterThan(4);
    for (const branch of classes.keys()) expect(branch).toMatch(/^shoulder \w+, elbow \w+, wrist \w+$/);
  });

  it('says how far a spot is out of reach, the track at its nearest end', () => {
    const far = reach(makeSolver(seven), { position: [1.2, 0, 0.355], direction: [1, 0, 0], roll: 0 });
    expect(far).toMatchObject({ reached: false, reason: 'too far' });
    expect(far.by).toBeCloseTo(1.2 - 0.13 - 0.455 - 0.425, 9);
    const reachOfSix = 0.2 + 0.88 + Math.hypot(0.16, 0.9);
    const beyond = reach(makeSolver(track), { position: [0, 4.5, 0.92], direction: [0, 1, 0], roll: 0 });
    expect(beyond).toMatchObject({ reached: false, reason: 'too far' });
    expect(beyond.by).toBeCloseTo(4.5 - 1.5 - 0.14 - reachOfSix, 6);
    // Between two samples of the slide only: refining has to find the way in.
    const edge = reach(makeSolver(track), {
      position: [0.14 + reachOfSix - 1e-6, 0.031, 0.92],
      direction: [1, 0, 0],
      roll: 0,
    });
    expect(edge.reached).toBe(true);
  });
});

describe('palletiser limits', () => {
  const solver = makeSolver(palletiser);
  it('keeps the angle between its arms, told as the forearm’s', () => {
    const wide: Arm = {
      ...palletiser,
      actuators: palletiser.actuators!.map((row) => ({ ...row, min: -3.2, max: 3.2 })),
    };
    // Stretched to a degree: the elbow would have to open beyond its 28°.
    const stretched = poser(wide)([0.2, 0.1, 0.12, 0]);
    const answer = reach(solver, { pose: stretched });
    expect(answer).toMatchObject({ reached: false, reason: 'joint limit', joint: 2 });
    expect(answer.by).toBeGreaterThan(0.1);
  });

  it('counts a chain joint in the limit margin', () => {
    const degree = Math.PI / 180;
    const [upper, fore] = [-20 * degree, 9 * degree];
    const margin = limitMargin(solver.chain, [0, upper, fore, 0]);
    expect(margin.joint).toBe(2);
    expect(margin.angle).toBeCloseTo((29 - 28) * degree, 12);
    expect(margin.share).toBeCloseTo((29 - 28) / (165 - 28), 12);
  });

  it('refuses a tilted tool', () => {
    expect(reach(solver, { position: [2, 0, 1], direction: [0.1, 0, -1], roll: 0 })).toMatchObject({
      reached: false,
      reason: 'direction',
    });
  });
});
