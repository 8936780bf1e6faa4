import { compileChain, forward, jacobian, makeStance } from './chain';
import { controlledFreedoms } from './freedoms';
import { limitMargin } from './limits';
import { makeGauge, measuresOf, NO_MEASURES } from './measures/gauge';
import { poseOf } from './transforms';
import type { Arm, PostureAnalysis } from './types';

export type PostureAnalyser = (actuators: ArrayLike<number>) => PostureAnalysis;

/** Compile once, analyse many: everything that KINEMATICS' table of measures says of one posture. Values in rad and m. */
export function makePostureAnalyser(arm: Arm): PostureAnalyser {
  const chain = compileChain(arm);
  const freedoms = controlledFreedoms(arm, chain);
  const n = chain.actuators;
  const stance = makeStance(chain);
  const matrix = new Float64Array(6 * n);
  const linear = freedoms.some((row) => row < 3);
  const free = linear ? makeGauge(chain, freedoms, 'free') : null;
  const held = linear ? makeGauge(chain, freedoms, 'held') : null;
  return (actuators) => {
    if (actuators.length !== n)
      throw new RangeError(`This arm has ${n} joint values to give, but ${actuators.length} were given.`);
    jacobian(chain, forward(chain, actuators, stance), matrix);
    return {
      pose: poseOf(stance.tool),
      jacobian: Array.from({ length: 6 }, (_, row) => Array.from(matrix.subarray(row * n, (row + 1) * n))),
      wristFree: free ? measuresOf(free.read(matrix)) : NO_MEASURES,
      wristHeld: held ? measuresOf(held.read(matrix)) : NO_MEASURES,
      limitMargin: limitMargin(chain, actuators),
    };
  };
}

/** One posture; see makePostureAnalyser for many. */
export function analysePosture(arm: Arm, actuators: ArrayLike<number>): PostureAnalysis {
  return makePostureAnalyser(arm)(actuators);
}
