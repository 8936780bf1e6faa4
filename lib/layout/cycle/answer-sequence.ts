import { hasFreeRoll, transformOfTarget } from '@/lib/kinematics/target';
import type { Arm, Target } from '@/lib/kinematics/types';
import { makeBench } from '../bench';
import { robotSchema } from '../items';
import { estimateSteps } from './estimate';
import type { ResolvedStep } from './resolve-steps';

/** A move to a target or a wait, in the arm's own frame: m and s. */
export type AskedStep =
  | {
      readonly target: Target;
      readonly motion: 'joint' | 'straight';
      readonly via: readonly (readonly [number, number, number])[];
      readonly dwell: number;
    }
  | { readonly wait: number };

export interface AnsweredStep {
  readonly reached: boolean;
  readonly reason: string | null;
  readonly motion: 'joint' | 'straight' | null;
  readonly moveTime: number;
  readonly hold: number;
  readonly slowestJoint: number | null;
  readonly branch: string;
  readonly posture: readonly number[] | null;
  readonly crossings: readonly { from: number; to: number; joint: number | null; speed: number }[];
}

const idOf = (index: number): string => `00000000-0000-4000-8000-${String(index).padStart(12, '0')}`;

/** Times a sequence of targets of one arm that stands in its own frame; see estimateCycle. */
export function answerSequence(arm: Arm, steps: readonly AskedStep[]): { time: number; steps: AnsweredStep[] } {
  const place = { xMm: 0, yMm: 0, angleDeg: 0 };
  const robot = robotSchema.parse({ kind: 'robot', id: idOf(0), name: 'Arm', armId: idOf(0), ...place });
  const { totalS, steps: timed, problems } = estimateSteps(makeBench(robot, arm, 'held'), steps.map(resolved));
  return {
    time: totalS,
    steps: steps.map((_, index): AnsweredStep => {
      const step = timed.find(({ stepId }) => stepId === idOf(index));
      const reasons = problems.filter(({ stepId }) => stepId === idOf(index)).map(({ message }) => message);
      return {
        reached: step !== undefined,
        reason: reasons.join(' ') || null,
        motion: step?.motion ?? null,
        moveTime: step?.moveS ?? 0,
        hold: step?.holdS ?? 0,
        slowestJoint: step?.slowestJoint ?? null,
        branch: step?.branch ?? '',
        posture: step?.posture ?? null,
        crossings: (step?.crossings ?? []).map(({ fromMm, toMm, joint, speedMmS }) => ({
          from: fromMm / 1000,
          to: toMm / 1000,
          joint,
          speed: speedMmS / 1000,
        })),
      };
    }),
  };
}

function resolved(asked: AskedStep, index: number): ResolvedStep {
  const id = idOf(index);
  const label = `Step ${index + 1}`;
  if ('wait' in asked) {
    return { kind: 'wait', step: { kind: 'wait', id, cause: 'process', name: label, seconds: asked.wait }, label };
  }
  const { target, motion, via, dwell } = asked;
  return {
    kind: 'point',
    step: {
      kind: 'point',
      id,
      fixtureId: id,
      taskPointId: id,
      place: null,
      motion,
      viaMm: via.map(([x, y, z]) => [1000 * x, 1000 * y, 1000 * z]),
    },
    label,
    pose: transformOfTarget(target),
    rollDeg: hasFreeRoll(target) ? 'free' : 0,
    dwellS: dwell,
  };
}
