import { limitMargin } from './limits';
import { makeGauge, measuresOf } from './measures/gauge';
import { reach, type ReachAnswer } from './reach';
import { skeleton } from './chain';
import { makeSolver, type Solver } from './solver';
import type { Arm, LimitMargin, Measures, Target, WristMode } from './types';

/** Everything that the plumb tells of one posture at a spot. Frames and units as in the arm that was given (m, rad, m/s). */
export interface SpotPosture {
  readonly posture: number[];
  /** Class of branch in words; '' where the chain has none. */
  readonly branch: string;
  readonly wristFree: Measures;
  readonly wristHeld: Measures;
  readonly limitMargin: LimitMargin;
  /** Joint (from zero) whose speed limit sets the sure speed with the wrist held; −1 where no single one does. */
  readonly bindingJoint: number;
  /** Sticks to draw: base, joint origins, flange, tool point. */
  readonly skeleton: [number, number, number][];
}

export interface SpotReading extends Pick<ReachAnswer, 'reached' | 'reason' | 'joint' | 'by'> {
  /** Best first, by inverse condition number in the wrist mode asked for. */
  readonly postures: SpotPosture[];
}

export type SpotReader = (target: Target) => SpotReading;

/** Compile once, drop the plumb many times. One posture a class of branch and roll: whole-turn copies are left out. */
export function makeSpotReader(arm: Arm, wrist: WristMode): SpotReader {
  const solver = makeSolver(arm);
  const free = makeGauge(solver.chain, solver.freedoms, 'free');
  const held = makeGauge(solver.chain, solver.freedoms, 'held');
  const scoreOf = (spot: SpotPosture) =>
    (wrist === 'held' ? spot.wristHeld : spot.wristFree).inverseConditionNumber ?? -1;

  const gauge = wrist === 'held' ? held : free;
  const worthOf = (posture: ArrayLike<number>) => gauge.readGains(solver.stand(posture)).inverseConditionNumber;

  return (target) => {
    const { reached, reason, joint, by, postures } = reach(solver, target, worthOf);
    const read = postures
      .map(({ posture, branch }): SpotPosture => {
        const matrix = solver.stand(posture);
        const wristFree = measuresOf(free.read(matrix));
        const reading = held.read(matrix);
        return {
          posture,
          branch,
          wristFree,
          wristHeld: measuresOf(reading),
          limitMargin: limitMargin(solver.chain, posture),
          bindingJoint: reading.bindingActuator,
          skeleton: skeleton(solver.chain, posture),
        };
      })
      .sort((left, right) => scoreOf(right) - scoreOf(left));
    return { reached, reason, joint, by, postures: onePerBranch(read, solver) };
  };
}

export function readSpot(arm: Arm, target: Target, wrist: WristMode): SpotReading {
  return makeSpotReader(arm, wrist)(target);
}

/** Of postures of one class, the best; of equals, the one with the most room to its limits. */
function onePerBranch(postures: SpotPosture[], solver: Solver): SpotPosture[] {
  if (!solver.closedForm) return postures;
  const kept = new Map<string, SpotPosture>();
  for (const spot of postures) {
    const known = kept.get(spot.branch);
    const score = (s: SpotPosture) => s.wristHeld.inverseConditionNumber ?? 0;
    const equal = known && Math.abs(score(known) - score(spot)) < 1e-9;
    if (!known || (equal && spot.limitMargin.share > known.limitMargin.share)) kept.set(spot.branch, spot);
  }
  return [...kept.values()];
}
