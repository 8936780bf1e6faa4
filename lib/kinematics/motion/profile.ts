import type { Chain } from '../chain';

/**
 * Time (s) of a move of one joint from rest to rest: speed rises at the acceleration, holds, and falls; short moves never reach the speed
 * and are a triangle. T = d/v + v/a, or 2 √(d/a) where d < v²/a (any textbook of robotics, such as Craig, "Introduction to
 * Robotics", on linear segments with parabolic blends). Distance in rad or m, speed and acceleration to match, both above zero.
 */
export function restToRestTime(distance: number, speed: number, acceleration: number): number {
  const d = Math.abs(distance);
  if (d === 0) return 0;
  return d < (speed * speed) / acceleration ? 2 * Math.sqrt(d / acceleration) : d / speed + speed / acceleration;
}

export interface JointMove {
  readonly seconds: number;
  /** Zero-based actuator that takes longest, to which the others are stretched; −1 where nothing moves. */
  readonly slowest: number;
}

/** A move in joint space: every joint stretched to the one that takes longest. Postures in rad or m. */
export function jointMove(chain: Chain, from: ArrayLike<number>, to: ArrayLike<number>): JointMove {
  let seconds = 0;
  let slowest = -1;
  for (let i = 0; i < chain.actuators; i++) {
    const time = restToRestTime(to[i] - from[i], chain.maxSpeed[i], chain.maxAcceleration[i]);
    if (time <= seconds) continue;
    seconds = time;
    slowest = i;
  }
  return { seconds, slowest };
}
