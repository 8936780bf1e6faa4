import { compileChain, forward, makeStance, type Chain } from '@/lib/kinematics/chain';
import type { Arm, Joint } from '@/lib/kinematics/types';

/** Sine below which two axes count as parallel. */
const PARALLEL = 1e-9;

/**
 * How far the tool point can come from the vertical line through the base's middle (m): a bound, never too small. Slides that come first
 * carry everything else without turning it, so their farthest corner is taken as it is; behind them links are added up. As
 * long as the axes so far stand upright, what lies along them lifts the tool but does not carry it outward, so
 * pedestals, first links and quills are left out.
 */
export function reachRadius(arm: Arm): number {
  const chain = compileChain({ ...arm, coupling: undefined, actuators: undefined });
  const slides = leadingSlides(chain);
  const { at, axis } = behindSlides(chain, slides);
  let radius = at;
  let upright = Math.hypot(axis[0], axis[1]) < PARALLEL;
  arm.joints.slice(slides).forEach((joint, index) => {
    // In Craig's convention the twist comes before the joint's own axis, in the standard one after it.
    const twistIsBehind = arm.convention === 'modified' && index === 0;
    if (arm.convention === 'modified' && !twistIsBehind) upright &&= keepsAxis(joint);
    radius += linkReach(twistIsBehind ? { ...joint, a: 0 } : joint, upright);
    if (arm.convention === 'standard') upright &&= keepsAxis(joint);
  });
  const tool = arm.tool?.xyz ?? [0, 0, 0];
  return radius + (upright ? Math.hypot(tool[0], tool[1]) : Math.hypot(...tool));
}

function leadingSlides({ prismatic }: Chain): number {
  const first = prismatic.indexOf(0);
  return first < 0 ? prismatic.length : first;
}

/** Farthest distance from the upright line that the slides carry what hangs behind them, and the direction of the axis there. */
function behindSlides(chain: Chain, slides: number): { at: number; axis: readonly [number, number] } {
  const stance = makeStance(chain);
  let at = 0;
  for (let corner = 0; corner < 2 ** slides; corner++) {
    const posture = chain.min.map((low, i) => (corner & (1 << i) ? chain.max[i] : low));
    const { origins, flange } = forward(chain, posture, stance);
    const [x, y] = slides < chain.joints ? [origins[3 * slides], origins[3 * slides + 1]] : [flange[3], flange[7]];
    at = Math.max(at, Math.hypot(x, y));
  }
  const { axes, flange } = stance;
  return { at, axis: slides < chain.joints ? [axes[3 * slides], axes[3 * slides + 1]] : [flange[2], flange[6]] };
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
