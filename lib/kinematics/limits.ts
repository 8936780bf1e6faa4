import type { Chain } from './chain';
import type { LimitMargin } from './types';

/**
 * Least distance to a limit over all actuators, compared as shares of each range; `joint` counts them from zero. Limits that a coupling's
 * chain joints have of their own decide whether a posture counts as inside (withinLimits), but have no margin of their own.
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
  return { joint, angle, share };
}

/** Rounding allowed at a limit: a posture typed exactly on it counts as inside (rad or m). */
export const LIMIT_SLACK = 1e-9;

export function withinLimits(chain: Chain, actuators: ArrayLike<number>): boolean {
  for (let i = 0; i < chain.actuators; i++)
    if (actuators[i] < chain.min[i] - LIMIT_SLACK || actuators[i] > chain.max[i] + LIMIT_SLACK) return false;
  if (!chain.coupling) return true;
  for (let j = 0; j < chain.joints; j++) {
    let value = 0;
    for (let k = 0; k < chain.actuators; k++) value += chain.coupling[j * chain.actuators + k] * actuators[k];
    if (value < chain.jointMin[j] - LIMIT_SLACK || value > chain.jointMax[j] + LIMIT_SLACK) return false;
  }
  return true;
}
