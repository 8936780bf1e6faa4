import { compileChain, forward, makeStance } from '../chain';
import { poseOf, pointDistance, rotationDistance, transformOfPose } from '../transforms';
import type { Arm, Pose } from '../types';

/** Stands one arm in many postures. */
export function poser(arm: Arm): (posture: ArrayLike<number>) => Pose {
  const chain = compileChain(arm);
  const stance = makeStance(chain);
  return (posture) => poseOf(forward(chain, posture, stance).tool);
}

/** How far a posture misses a pose: m and rad, the larger of both. */
export function missOf(reached: Pose, wanted: Pose): number {
  const [left, right] = [transformOfPose(reached), transformOfPose(wanted)];
  return Math.max(pointDistance(left, right), rotationDistance(left, right));
}

/** Largest difference of two postures over their joints (rad, m). */
export const postureDistance = (left: ArrayLike<number>, right: ArrayLike<number>): number =>
  Math.max(...Array.from(left, (value, i) => Math.abs(value - right[i])));
