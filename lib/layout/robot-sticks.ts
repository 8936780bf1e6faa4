import { compileChain, skeleton } from '@/lib/kinematics/chain';
import type { Arm } from '@/lib/kinematics/types';
import type { PointMm } from './geometry';
import type { Robot } from './items';
import { armWithTool } from './robot-frame';

/** A link as seen from above, in the robot's own frame. */
export interface Stick {
  readonly from: PointMm;
  readonly to: PointMm;
}

export interface RobotSticks {
  readonly sticks: readonly Stick[];
  /** Joints that stand apart from the base and the tool in plan. */
  readonly joints: readonly PointMm[];
  readonly toolPoint: PointMm;
  readonly baseRadiusMm: number;
  readonly linkWidthMm: number;
}

/** Links shorter than this in plan stand upright and are not drawn. */
const SHORTEST_STICK_MM = 15;

/** What is drawn of a robot in a posture (actuator values, rad or m), seen from above. */
export function robotSticks(
  definition: Arm,
  tool: Robot['tool'],
  posture: ArrayLike<number>,
  reachMm: number,
): RobotSticks {
  const chain = compileChain(armWithTool(definition, tool));
  const points = skeleton(chain, posture).map(([x, y]): PointMm => [x * 1000, y * 1000]);
  const toolPoint = points[points.length - 1];
  const sticks: Stick[] = [];
  let from = points[0];
  for (const to of points.slice(1)) {
    if (Math.hypot(to[0] - from[0], to[1] - from[1]) < SHORTEST_STICK_MM) continue;
    sticks.push({ from, to });
    from = to;
  }
  const apart = (a: PointMm, b: PointMm) => Math.hypot(a[0] - b[0], a[1] - b[1]) > SHORTEST_STICK_MM;
  const joints = sticks.map(({ to }) => to).filter((joint) => apart(joint, toolPoint) && apart(joint, points[0]));
  return { sticks, joints, toolPoint, ...robotSizes(reachMm) };
}

/** Base plate and link width follow the arm's reach, within what such arms have. */
export function robotSizes(reachMm: number): { readonly baseRadiusMm: number; readonly linkWidthMm: number } {
  return {
    baseRadiusMm: Math.min(360, Math.max(90, reachMm * 0.095)),
    linkWidthMm: Math.min(190, Math.max(44, reachMm * 0.052)),
  };
}
