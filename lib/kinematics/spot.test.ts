import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from './library';
import { analysePosture } from './posture';
import { makeSpotReader, readSpot } from './spot';
import { missOf, poser } from './testing/round-trip';
import { compileChain, skeleton } from './chain';
import type { Target } from './types';

const medium = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-12kg')!.arm;
const target: Target = { position: [0.8, 0.2, 0.4], direction: [0.1, 0, -1], roll: 0.3 };

describe('the plumb', () => {
  it.each(['held', 'free'] as const)('reads every class of branch once, best first, wrist %s', (wrist) => {
    const { reached, postures } = readSpot(medium, target, wrist);
    expect(reached).toBe(true);
    expect(postures.length).toBeGreaterThan(1);
    expect(new Set(postures.map(({ branch }) => branch)).size).toBe(postures.length);
    const scores = postures.map((spot) => (wrist === 'held' ? spot.wristHeld : spot.wristFree).inverseConditionNumber!);
    expect(scores).toEqual([...scores].sort((a, b) => b - a));
  });

  it('reads what the analysis of the same posture says', () => {
    const stand = poser(medium);
    const { postures } = readSpot(medium, target, 'held');
    for (const spot of postures) {
      const whole = analysePosture(medium, spot.posture);
      expect(spot.wristHeld).toEqual(whole.wristHeld);
      expect(spot.wristFree).toEqual(whole.wristFree);
      expect(spot.limitMargin).toEqual(whole.limitMargin);
      expect(missOf(stand(spot.posture), whole.pose)).toBe(0);
      const sticks = skeleton(compileChain(medium), spot.posture);
      expect(spot.skeleton).toEqual(sticks);
      expect(Math.hypot(...sticks[sticks.length - 1].map((value, i) => value - [0.8, 0.2, 0.4][i]))).toBeLessThan(1e-9);
    }
  });

  it('names the joint whose speed sets the sure speed: a faster one there helps, elsewhere it does not', () => {
    const [{ posture, bindingJoint, wristHeld }] = readSpot(medium, target, 'held').postures;
    const faster = (joint: number) => ({
      ...medium,
      joints: medium.joints.map((row, i) => (i === joint ? { ...row, maxSpeed: 1.01 * row.maxSpeed } : row)),
    });
    expect(bindingJoint).toBeGreaterThanOrEqual(0);
    medium.joints.forEach((_, joint) => {
      const { sureSpeed } = analysePosture(faster(joint), posture).wristHeld;
      if (joint === bindingJoint) expect(sureSpeed! / wristHeld.sureSpeed!).toBeGreaterThan(1.005);
      else expect(sureSpeed! / wristHeld.sureSpeed!).toBeCloseTo(1, 9);
    });
  });

  it('says why a spot is out', () => {
    const reading = makeSpotReader(medium, 'held')({ ...target, position: [2.5, 0, 0.4] });
    expect(reading).toMatchObject({ reached: false, reason: 'too far', postures: [] });
    expect(reading.by).toBeGreaterThan(0.9);
  });
});
