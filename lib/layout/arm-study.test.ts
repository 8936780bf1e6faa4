import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import type { Arm } from '@/lib/kinematics/types';
import { studyArm, type StudyStep } from './arm-study';

const stepsOf = (arm: Arm): StudyStep[] => [...studyArm(arm)].filter((step) => step !== null);

describe('studyArm', () => {
  it('tells the facts first, then the cut in large cells and row by row, then the fastest speed', () => {
    const steps = stepsOf(BUILT_IN_ARMS.find(({ slug }) => slug === 'scara-5kg')!.arm);
    const [facts, coarse] = steps;
    if (facts.kind !== 'facts' || coarse.kind !== 'coarse') throw new Error(`${facts.kind}, ${coarse.kind} came first`);
    expect(facts.reachMm).toBeCloseTo(600, 3);
    expect(facts.chain.method).toMatch(/closed form/);
    // Of the size of its links: between the quill's neighbourhood and the whole reach.
    expect(facts.weighingLengthMm).toBeGreaterThan(30);
    expect(facts.weighingLengthMm).toBeLessThan(600);
    expect(steps.filter(({ kind }) => kind === 'row')).toHaveLength(facts.grid.rows);
    expect(coarse.rows).toHaveLength(facts.grid.rows / 4);
    const done = steps.at(-1)!;
    if (done.kind !== 'done') throw new Error(`${done.kind} came last`);
    // Both level joints with the arm stretched: 0.6 m · 430 °/s + 0.275 m · 680 °/s is the most that there can be.
    const most = (0.6 * 430 + 0.275 * 680) * (Math.PI / 180);
    expect(done.fastestMPerS).toBeGreaterThan(0.5 * most);
    // Beside it the quill may move as well.
    expect(done.fastestMPerS).toBeLessThan(Math.hypot(most, 1.1) + 1e-6);
  });

  it('ends with the facts of a chain that reaches nowhere', () => {
    const joint = {
      type: 'revolute' as const,
      a: 0,
      alpha: 0,
      d: 0.2,
      theta: 0,
      min: -1,
      max: 1,
      maxSpeed: 1,
      maxAcceleration: 1,
    };
    expect(stepsOf({ convention: 'standard', joints: [joint] })).toMatchObject([{ kind: 'facts', reachMm: 0 }]);
  });
});
