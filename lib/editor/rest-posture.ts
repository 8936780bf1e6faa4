import { makeSpotReader } from '@/lib/kinematics/spot';
import type { Arm } from '@/lib/kinematics/types';
import type { Robot } from '@/lib/layout/items';
import { armWithTool } from '@/lib/layout/robot-frame';

/** How far out a resting tool is looked for, as shares of the reach. */
const SHARES = [0.62, 0.7, 0.55, 0.8, 0.4];

/**
 * Joint values that a robot is drawn in while it has nothing to show: tool down, in front of its base. Null where the arm cannot
 * stand so; it is then drawn as its base.
 */
export function restPosture(definition: Arm, reachMm: number, tool: Robot['tool']): readonly number[] | null {
  const read = makeSpotReader(armWithTool(definition, tool), 'held');
  const reach = reachMm / 1000;
  for (const share of SHARES) {
    for (const height of [0.25, 0.1, 0, 0.4]) {
      const { postures } = read({ position: [share * reach, 0, height * reach], direction: [0, 0, -1], roll: 'free' });
      if (postures.length > 0) return postures[0].posture;
    }
  }
  return null;
}
