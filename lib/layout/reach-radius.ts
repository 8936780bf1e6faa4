import { transformOf } from '@/lib/kinematics/transforms';
import type { Arm, Joint } from '@/lib/kinematics/types';

/** Sine below which two axes count as parallel. */
const PARALLEL = 1e-9;

/**
 * How far the tool point can come from the vertical line through the base's middle (m): a bound, never too small, found by
 * adding up the links. As long as the axes so far stand upright, what lies along them lifts the tool but does not
 * carry it outward, so pedestals, first links and quills are left out.
 */
export function reachRadius(arm: Arm): number {
  const base = transformOf(arm.base);
  let radius = Math.hypot(base[3], base[7]);
  let upright = Math.hypot(base[2], base[6]) < PARALLEL;
  for (const joint of arm.joints) {
    // In Craig's convention the twist comes before the joint's own axis, in the standard one after it.
    if (arm.convention === 'modified') upright &&= keepsAxis(joint);
    radius += linkReach(joint, upright);
    if (arm.convention === 'standard') upright &&= keepsAxis(joint);
  }
  const tool = arm.tool?.xyz ?? [0, 0, 0];
  return radius + (upright ? Math.hypot(tool[0], tool[1]) : Math.hypot(...tool));
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
