import type { Chain } from './chain';
import type { LimitMargin } from './types';

/**
 * Least distance to a limit, compared as shares of each range; `joint` counts the actuators from zero. Under a coupling the chain joints
 * have limits too: those count for the actuator that drives them, with the angle of the chain joint.
 */
export function limitMargin(chain: Chain, actuators: ArrayLike<number>): LimitMargin {
  let joint = 0;
  let angle = Infinity;
  let share = Infinity;
  for (let i = 0; i < chain.actuators; i++) {
    const left = Math.min(actuators[i] - chain.min[i], chain.max[i] - actuators[i]);
    const part = left / (chain.max[i] - chain.min[i]);
    if (part < share) {
      joint = i;
      angle = left;
      share = part;
    }
  }
  if (!chain.coupling) return { joint, angle, share };
  for (let j = 0; j < chain.joints; j++) {
    const driver = driverOf(chain, j);
    if (driver < 0) continue;
    const value = jointValue(chain, j, actuators, 0);
    const left = Math.min(value - chain.jointMin[j], chain.jointMax[j] - value);
    const part = left / (chain.jointMax[j] - chain.jointMin[j]);
    if (part < share) {
      joint = driver;
      angle = left;
      share = part;
    }
  }
  return { joint, angle, share };
}

/** The share of limitMargin alone, for loops: allocates nothing. */
export function limitShare(chain: Chain, actuators: ArrayLike<number>): number {
  let share = Infinity;
  for (let i = 0; i < chain.actuators; i++) {
    const left = Math.min(actuators[i] - chain.min[i], chain.max[i] - actuators[i]);
    share = Math.min(share, left / (chain.max[i] - chain.min[i]));
  }
  if (!chain.coupling) return share;
  for (let j = 0; j < chain.joints; j++) {
    if (driverOf(chain, j) < 0) continue;
    const value = jointValue(chain, j, actuators, 0);
    const left = Math.min(value - chain.jointMin[j], chain.jointMax[j] - value);
    share = Math.min(share, left / (chain.jointMax[j] - chain.jointMin[j]));
  }
  return share;
}

/** Value of chain joint j under the coupling (rad, m); `at`: where the posture starts. */
export function jointValue(chain: Chain, j: number, actuators: ArrayLike<number>, at: number): number {
  let value = 0;
  for (let k = 0; k < chain.actuators; k++) value += chain.coupling![j * chain.actuators + k] * actuators[at + k];
  return value;
}

/** The actuator with the largest share in chain joint j, of equals the last, as it is the one farther out; −1 where none moves it. */
export function driverOf(chain: Chain, j: number): number {
  let driver = -1;
  let most = 0;
  for (let k = 0; k < chain.actuators; k++) {
    const share = Math.abs(chain.coupling![j * chain.actuators + k]);
    if (share === 0 || share < most) continue;
    most = share;
    driver = k;
  }
  return driver;
}

/** Rounding allowed at a limit: a posture typed exactly on it counts as inside (rad or m). */
export const LIMIT_SLACK = 1e-9;

export function withinLimits(chain: Chain, actuators: ArrayLike<number>): boolean {
  for (let i = 0; i < chain.actuators; i++)
    if (actuators[i] < chain.min[i] - LIMIT_SLACK || actuators[i] > chain.max[i] + LIMIT_SLACK) return false;
  return withinJointLimits(chain, actuators);
}

/** Whether the chain joints of a coupling keep the limits that they have of their own. */
export function withinJointLimits(chain: Chain, actuators: ArrayLike<number>): boolean {
  if (!chain.coupling) return true;
  for (let j = 0; j < chain.joints; j++) {
    const value = jointValue(chain, j, actuators, 0);
    if (value < chain.jointMin[j] - LIMIT_SLACK || value > chain.jointMax[j] + LIMIT_SLACK) return false;
  }
  return true;
}
