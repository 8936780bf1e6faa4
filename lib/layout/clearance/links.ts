import { forward, makeStance, type Chain, type Stance } from '@/lib/kinematics/chain';
import { robotSizes } from '../robot-sticks';

/**
 * A robot as capsules: a stick from the base through every joint to the flange, each with a radius, and the tool behind it.
 * Points in the frame that the base is given in (m), three numbers a point: base, joint origins, flange, tool point.
 */
export interface Links {
  readonly points: Float64Array;
  /** One a stick; the last is the tool's. */
  readonly radii: Float64Array;
  readonly count: number;
  readonly stance: Stance;
}

/**
 * Radius (m) that a link is taken with: the whole width that it is drawn with, which follows the arm's reach. An estimate for
 * planning on the careful side, and told as one.
 */
export function estimatedLinkRadius(reachMm: number): number {
  return robotSizes(reachMm).linkWidthMm / 1000;
}

/** @param toolRadius of the tool or what it carries, whichever stands out farther (m). */
export function makeLinks(chain: Chain, linkRadius: number, toolRadius: number): Links {
  const count = chain.joints + 2;
  const radii = new Float64Array(count).fill(linkRadius);
  radii[count - 1] = toolRadius;
  return { points: new Float64Array(3 * (count + 1)), radii, count, stance: makeStance(chain) };
}

/** Puts the links where a posture holds them (actuator values, rad or m). Allocates nothing. */
export function standLinks(chain: Chain, posture: ArrayLike<number>, links: Links): Links {
  const { stance, points } = links;
  forward(chain, posture, stance);
  points[0] = chain.base[3];
  points[1] = chain.base[7];
  points[2] = chain.base[11];
  points.set(stance.origins, 3);
  const flange = 3 * (chain.joints + 1);
  for (let axis = 0; axis < 3; axis += 1) {
    points[flange + axis] = stance.flange[4 * axis + 3];
    points[flange + 3 + axis] = stance.tool[4 * axis + 3];
  }
  return links;
}
