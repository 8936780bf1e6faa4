import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import type { ToleranceQuestion } from './question';
import { makeToleranceComputer, wilsonInterval } from './tolerance';

const arm = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-6kg')!.arm;

const question = (change: Partial<ToleranceQuestion> = {}): ToleranceQuestion => ({
  study: 'tolerance',
  armId: '00000000-0000-4000-8000-0000000000aa',
  tool: { xMm: 0, yMm: 0, zMm: 100, rollDeg: 0, pitchDeg: 0, yawDeg: 0 },
  wrist: 'held',
  robot: { xMm: 0, yMm: 0, angleDeg: 0, riserMm: 0 },
  points: [reachedAt(500)],
  placeMm: 5,
  turnDeg: 0.5,
  levelDeg: 0.2,
  trials: 200,
  seed: 1,
  ...change,
});

const reachedAt = (xMm: number) => ({
  fixture: { xMm: 0, yMm: 0, angleDeg: 0 },
  xMm,
  yMm: 0,
  zMm: 300,
  tiltDeg: 0,
  azimuthDeg: 0,
  rollDeg: 'free' as const,
  speedMmS: null,
});

const run = (asked: ToleranceQuestion) => {
  const computer = makeToleranceComputer(asked, arm);
  return computer.answer([computer.trials(0, asked.trials)]);
};

/** The farthest x at which the point is still reached, by halving. */
function edgeMm(): number {
  let [inside, outside] = [500, 2000];
  while (outside - inside > 1e-6) {
    const middle = (inside + outside) / 2;
    if (run(question({ points: [reachedAt(middle)], trials: 10 })).keptByPoint[0] !== null) inside = middle;
    else outside = middle;
  }
  return inside;
}

describe('installation tolerance', () => {
  it('is certain without an error', () => {
    expect(run(question({ placeMm: 0, turnDeg: 0, levelDeg: 0 }))).toMatchObject({ kept: 200, share: 1 });
  });

  it('keeps about half of the trials at the very edge of reach', () => {
    // On the edge an error towards the point keeps it and one away loses it: half of the trials, by symmetry. The small drop in
    // height of a spherical edge and its bend cost little at 0.01 mm.
    const points = [reachedAt(edgeMm() - 1e-6)];
    const { share } = run(question({ points, placeMm: 0.01, turnDeg: 0, levelDeg: 0, trials: 2000 }));
    expect(share).toBeGreaterThan(0.45);
    expect(share).toBeLessThan(0.55);
  });

  it('counts every trial as kept once the margin is larger than any error', () => {
    const points = [reachedAt(edgeMm() - 20)];
    const near = run(question({ points, placeMm: 1, turnDeg: 0, levelDeg: 0 }));
    const far = run(question({ points, placeMm: 60, turnDeg: 0, levelDeg: 0, trials: 1000 }));
    expect(near.share).toBe(1);
    // Errors of 60 mm take a point over an edge 20 mm away in some of the trials, and never the half that move it inwards.
    expect(far.share).toBeLessThan(1);
    expect(far.share).toBeGreaterThan(0.25);
  });

  it('gives the same answer for the same seed, however the trials are cut', () => {
    const asked = question({ points: [reachedAt(500), reachedAt(edgeMm() - 1)], placeMm: 3 });
    const computer = makeToleranceComputer(asked, arm);
    const cut = computer.answer([computer.trials(0, 13), computer.trials(13, 150), computer.trials(150, 200)]);
    expect(cut).toEqual(run(asked));
    expect(run({ ...asked, seed: 2 }).kept).not.toBe(cut.kept);
  });

  it('leaves out points that are not reached as drawn', () => {
    const { keptByPoint, share } = run(question({ points: [reachedAt(500), reachedAt(5000)], placeMm: 0.1 }));
    expect(keptByPoint).toEqual([200, null]);
    expect(share).toBe(1);
  });

  it('tells the interval as Wilson (1927) does', () => {
    // 8 of 10 with 95 %: 0.4902 … 0.9433 (Wilson's score interval; the figures are from memory of textbook tables).
    const [low, high] = wilsonInterval(8, 10);
    expect(low).toBeCloseTo(0.4902, 3);
    expect(high).toBeCloseTo(0.9433, 3);
  });
});
