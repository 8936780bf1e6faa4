import { cheapestWay } from '@/lib/kinematics/motion/branch-choice';
import type { Bench } from '../bench';
import type { Name } from './build-layers';
import { jointSeconds, straightTo, type Layer, type MotionStep, type StraightMove } from './layers';

export interface Chosen {
  readonly states: readonly number[];
  /** The straight way from the last step back to the first; null where that is a joint move. */
  readonly closing: StraightMove | null;
}

/** Joint values (rad, m) up to which a straight way counts as coming to a posture. */
const SAME_POSTURE = 1e-4;

/** The states that make the round quickest; null where nothing is reached. */
export function chooseStates(
  bench: Bench,
  moves: readonly MotionStep[],
  layers: readonly Layer[],
  name: Name,
): Chosen | null {
  if (layers.length === 0) return null;
  const sizes = layers.map(({ ends }) => ends.length);
  const last = layers[layers.length - 1];
  const [first] = layers;
  const moveCost = (layer: number, from: number, to: number): number => {
    const next = layers[layer + 1];
    if (!next.straightFrom) return jointSeconds(bench, layers[layer].ends[from], next.arrivals[to]) + next.runS[to];
    const move = next.straightFrom[to];
    return move?.before === from ? move.seconds + next.runS[to] : Infinity;
  };
  const closeByJoints = (from: number, to: number): number =>
    jointSeconds(bench, last.ends[from], first.arrivals[to]) + first.runS[to];
  if (moves[0].step.motion === 'straight') {
    const ways = last.ends.map((posture, index) => straightTo(bench, posture, index, moves[0]).move);
    const closeStraight = (from: number, to: number): number => {
      const way = ways[from];
      const end = way?.postures[way.postures.length - 1];
      const same = end && Array.from(end).every((value, i) => Math.abs(value - first.arrivals[to][i]) < SAME_POSTURE);
      return same ? way.seconds + first.runS[to] : Infinity;
    };
    const found = cheapestWay(sizes, moveCost, closeStraight);
    if (found) return { states: found.states, closing: ways[found.states[found.states.length - 1]] };
    name(moves[0], 'The straight way from the last step cannot be kept. Timed as a joint move instead.');
  }
  const found = cheapestWay(sizes, moveCost, closeByJoints);
  return found && { states: found.states, closing: null };
}
