import { compileChain, forward, makeStance, type Chain } from '@/lib/kinematics/chain';
import type { Arm, Joint } from '@/lib/kinematics/types';
import { farthest } from '../farthest-posture';
import { itemToFloor, type PointMm } from '../geometry';
import type { JointStop, Robot } from '../items';
import { reachRadius } from '../reach-radius';
import { armWithTool } from '../robot-frame';
import { estimatedLinkRadius, makeLinks, standLinks } from '../clearance/links';

/**
 * The spaces of a robot (terms of ISO 10218-1) as outlines on the floor, mm, floor frame. All are drawn without dents and holes:
 * outlines may be larger than the true space, never smaller where that can be promised.
 */
export type SpaceKind = 'maximum' | 'restricted' | 'operating';

export interface Space {
  readonly kind: SpaceKind;
  readonly outlineMm: readonly PointMm[];
  /** How it was found, in words. */
  readonly how: string;
}

export const SPACE_WORDS: Record<SpaceKind, string> = {
  maximum: 'Maximum space',
  restricted: 'Restricted space',
  operating: 'Operating space',
};

/** Directions that an outline is worked out in. */
const DIRECTIONS = 36;
const CIRCLE_SIDES = 72;

/** How far tool and part stand out from the tool point (mm): whichever stands out farther. */
export const workRadiusMm = ({ tool, part }: Robot): number => Math.max(tool.radiusMm, part?.radiusMm ?? 0);

/**
 * All that moving parts, tool and part can come to by design. A circle about the base: a bound from the lengths of the
 * links that is never too small.
 */
export function maximumSpace(robot: Robot, arm: Arm, reachMm: number): Space {
  const links = estimatedLinkRadius(reachMm) * 1000;
  const radius = reachRadius(armWithTool(arm, robot.tool)) * 1000 + Math.max(workRadiusMm(robot), links);
  const outlineMm = Array.from({ length: CIRCLE_SIDES }, (_, index) => {
    const angle = (2 * Math.PI * index) / CIRCLE_SIDES;
    // The sides touch the circle from outside.
    const corner = radius / Math.cos(Math.PI / CIRCLE_SIDES);
    return itemToFloor(robot, [corner * Math.cos(angle), corner * Math.sin(angle)]);
  });
  return { kind: 'maximum', outlineMm, how: 'Circle from the lengths of links, tool and part' };
}

/**
 * The maximum space as limiting devices on the joints cut it, found by a search over postures within the stops. The same as
 * the maximum space where there is no stop. One direction after the other, since each takes some 50 ms: `next` answers null
 * until all are done.
 */
export function restrictedSearch(robot: Robot, arm: Arm, reachMm: number): { readonly next: () => Space | null } {
  if (robot.jointStops.length === 0) {
    const space: Space = {
      ...maximumSpace(robot, arm, reachMm),
      kind: 'restricted',
      how: 'No limiting device is entered',
    };
    return { next: () => space };
  }
  const stopped = armWithTool(withStops(arm, robot.jointStops), robot.tool);
  const extent = extentOf(compileChain(stopped), estimatedLinkRadius(reachMm), workRadiusMm(robot) / 1000);
  const found: Float64Array[] = [];
  return {
    next: () => {
      if (found.length < DIRECTIONS) {
        found.push(farthestAlong(stopped, extent, ...directionOf(found.length)));
        return null;
      }
      // Every posture counts in every direction, so that one poor search leaves no dent.
      const support = supports((x, y) => found.reduce((most, posture) => Math.max(most, extent(posture, x, y)), 0));
      return {
        kind: 'restricted',
        outlineMm: outlineOf(support).map(([x, y]) => itemToFloor(robot, [x * 1000, y * 1000])),
        how: 'Search over postures within the limiting devices',
      };
    },
  };
}

/** The whole search at once. */
export function restrictedSpace(robot: Robot, arm: Arm, reachMm: number): Space {
  const search = restrictedSearch(robot, arm, reachMm);
  for (;;) {
    const space = search.next();
    if (space) return space;
  }
}

/** Limits narrowed to the stops; a stop wider than the arm's own limit changes nothing. */
export function withStops(arm: Arm, stops: readonly JointStop[]): Arm {
  const narrowed = <T extends { min: number; max: number }>(rows: readonly T[], types: readonly Joint['type'][]): T[] =>
    rows.map((row, index) => {
      const stop = stops.find(({ joint }) => joint === index + 1);
      if (!stop) return row;
      const unit = types[index] === 'prismatic' ? 1e-3 : Math.PI / 180;
      const min = Math.min(row.max, Math.max(row.min, stop.min * unit));
      return { ...row, min, max: Math.max(min, Math.min(row.max, stop.max * unit)) };
    });
  const types = arm.joints.map(({ type }) => type);
  if (arm.actuators) return { ...arm, actuators: narrowed(arm.actuators, types) };
  return { ...arm, joints: narrowed(arm.joints, types) };
}

/**
 * What the robot sweeps while it does its work: links, tool and part in postures along its moves.
 * @param postures actuator values (rad, m) along the moves, close together.
 */
export function operatingSpace(
  robot: Robot,
  arm: Arm,
  reachMm: number,
  postures: readonly (readonly number[])[],
): Space | null {
  if (postures.length === 0) return null;
  const chain = compileChain(armWithTool(arm, robot.tool));
  const links = makeLinks(chain, estimatedLinkRadius(reachMm), workRadiusMm(robot) / 1000);
  const support = supports(() => -Infinity);
  for (const posture of postures) {
    const { points, radii, count } = standLinks(chain, posture, links);
    for (let point = 0; point <= count; point += 1) {
      const radius = Math.max(radii[Math.min(point, count - 1)], point > 0 ? radii[point - 1] : 0);
      support.forEach((known, index) => {
        const [x, y] = directionOf(index);
        support[index] = Math.max(known, points[3 * point] * x + points[3 * point + 1] * y + radius);
      });
    }
  }
  return {
    kind: 'operating',
    outlineMm: outlineOf(support).map(([x, y]) => itemToFloor(robot, [x * 1000, y * 1000])),
    how: 'Moves in joint space from task point to task point, in order',
  };
}

const directionOf = (index: number): [number, number] => {
  const angle = (2 * Math.PI * index) / DIRECTIONS;
  return [Math.cos(angle), Math.sin(angle)];
};

const supports = (along: (x: number, y: number) => number): number[] =>
  Array.from({ length: DIRECTIONS }, (_, index) => along(...directionOf(index)));

type Extent = (posture: ArrayLike<number>, x: number, y: number) => number;

/** How far a posture reaches in one direction of the plan, links and tool with their radii (m). */
function extentOf(chain: Chain, linkM: number, toolM: number): Extent {
  const stance = makeStance(chain);
  return (posture, x, y) => {
    const { origins, flange, tool } = forward(chain, posture, stance);
    let most = Math.max(flange[3] * x + flange[7] * y + linkM, tool[3] * x + tool[7] * y + toolM);
    for (let joint = 0; joint < chain.joints; joint += 1) {
      const extent = origins[3 * joint] * x + origins[3 * joint + 1] * y + linkM;
      if (extent > most) most = extent;
    }
    return most;
  };
}

/** The posture that reaches farthest in one direction, of all that the search came by. */
function farthestAlong(arm: Arm, extent: Extent, x: number, y: number): Float64Array {
  let best = new Float64Array(arm.joints.length);
  let most = -Infinity;
  farthest(arm, (posture) => {
    const here = extent(posture, x, y);
    if (here > most) {
      most = here;
      best = posture.slice();
    }
    return here;
  });
  return best;
}

/** Corners where the lines meet that touch the space in neighbouring directions: the space lies inside. */
function outlineOf(support: readonly number[]): PointMm[] {
  const step = (2 * Math.PI) / DIRECTIONS;
  return support.map((extent, index) => {
    const next = support[(index + 1) % DIRECTIONS];
    const along = (next - extent * Math.cos(step)) / Math.sin(step);
    const [x, y] = directionOf(index);
    return [extent * x - along * y, extent * y + along * x];
  });
}
