import type { Arm, Joint } from '@/lib/kinematics/types';
import { matrixOf, type Matrix3 } from './rotation';

/** Sine below which two axes count as parallel. */
const PARALLEL = 1e-9;

/**
 * How far the tool point can come from the vertical line through the base's middle (m): a bound, never too small, found by
 * adding up the links. As long as the axes so far stand upright, what lies along them lifts the tool but does not
 * carry it outward, so pedestals, first links and quills are left out.
 */
export function reachRadius(arm: Arm): number {
  const base = arm.base ?? { xyz: [0, 0, 0], rpy: [0, 0, 0] };
  let radius = Math.hypot(base.xyz[0], base.xyz[1]);
  let upright = isUpright(matrixOf(base.rpy));
  for (const joint of arm.joints) {
    // In Craig's convention the twist comes before the joint's own axis, in the standard one after it.
    if (arm.convention === 'modified') upright &&= keepsAxis(joint);
    radius += linkReach(joint, upright);
    if (arm.convention === 'standard') upright &&= keepsAxis(joint);
  }
  const tool = arm.tool?.xyz ?? [0, 0, 0];
  return radius + (upright ? Math.hypot(tool[0], tool[1]) : Math.hypot(...tool));
}

function isUpright(rotation: Matrix3): boolean {
  return Math.hypot(rotation[0][2], rotation[1][2]) < PARALLEL;
}

function keepsAxis(joint: Joint): boolean {
  return Math.abs(Math.sin(joint.alpha)) < PARALLEL;
}

function linkReach(joint: Joint, axisIsUpright: boolean): number {
  if (axisIsUpright) return Math.abs(joint.a);
  const along =
    joint.type === 'prismatic' ? Math.max(Math.abs(joint.d + joint.min), Math.abs(joint.d + joint.max)) : joint.d;
  return Math.hypot(joint.a, along);
}
