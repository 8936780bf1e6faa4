import { compileChain, type Chain } from '@/lib/kinematics/chain';
import { identityTransform, multiplyTransforms } from '@/lib/kinematics/transforms';
import type { Arm } from '@/lib/kinematics/types';
import type { Item, Robot } from '../items';
import { reachRadius } from '../reach-radius';
import { armWithTool, frameOnFloor } from '../robot-frame';
import { linksToLinks, linksToPrisms, nothingNear, type Nearest } from './clearance';
import { estimatedLinkRadius, makeLinks, standLinks, type Links } from './links';
import { solidsOf, type Solid } from './solids';

/** A posture that a robot takes at its work; joint values in rad or m. */
export interface WorkPosture {
  readonly name: string;
  /** The fixture that the tool works on and may touch. */
  readonly fixtureId: string;
  readonly joints: readonly number[];
}

export interface WorkingRobot {
  readonly robot: Robot;
  readonly arm: Arm;
  readonly reachMm: number;
  /** In the order of the work. */
  readonly postures: readonly WorkPosture[];
}

/** What a robot comes nearest to, mm; below zero where bodies run into one another. */
export interface ClearanceRow {
  readonly distanceMm: number;
  /** At a point, or on the way between two. */
  readonly where: string;
  readonly moving: boolean;
  /** The part of the robot: a link counted from 1, or the tool. */
  readonly part: string;
  readonly other: string;
  readonly otherId: string;
}

export interface RobotClearance {
  readonly robotId: string;
  readonly linkRadiusMm: number;
  /** The nearest at every point and on every way, nearest first; empty where nothing stands round. */
  readonly rows: readonly ClearanceRow[];
}

/** How far any part of the arm may come between two looks along a move, mm; a distance may be nearer by half of it. */
export const MOVE_STEP_MM = 20;

interface Stood {
  readonly source: WorkingRobot;
  readonly chain: Chain;
  readonly links: Links;
  readonly reachM: number;
  /** The links as each posture of the work holds them. */
  readonly held: readonly Links[];
}

/**
 * Least distances of every robot from what stands round it and from the other robots, at its task points and along moves in
 * joint space from one to the next. The other robot is taken at each of its own task points, whenever it may be there.
 */
export function clearanceOfRobots(robots: readonly WorkingRobot[], items: readonly Item[]): RobotClearance[] {
  const solids = solidsOf(items);
  const stood = robots.map(standRobot);
  return stood.map((one) => {
    const rows = one.source.postures.flatMap((posture, index) => {
      const next = one.source.postures[index + 1];
      const found = [rowAt(one, posture.name, false, [posture.joints], solids, posture.fixtureId, stood)];
      if (next) {
        const way = `${posture.name} to ${next.name}`;
        found.push(rowAt(one, way, true, wayBetween(one, posture, next), solids, null, stood));
      }
      return found.filter((row) => row !== null);
    });
    rows.sort((a, b) => a.distanceMm - b.distanceMm);
    return { robotId: one.source.robot.id, linkRadiusMm: one.links.radii[0] * 1000, rows };
  });
}

function standRobot(source: WorkingRobot): Stood {
  const { robot, reachMm } = source;
  const arm = armWithTool(source.arm, robot.tool);
  const compiled = compileChain(arm);
  const base = multiplyTransforms(frameOnFloor(robot, robot.riserMm), compiled.base, identityTransform());
  const chain = { ...compiled, base };
  const radiusMm = Math.max(robot.tool.radiusMm, robot.part?.radiusMm ?? 0);
  const newLinks = () => makeLinks(chain, estimatedLinkRadius(reachMm), radiusMm / 1000);
  return {
    source,
    chain,
    links: newLinks(),
    reachM: reachRadius(arm),
    held: source.postures.map(({ joints }) => standLinks(chain, joints, newLinks())),
  };
}

function rowAt(
  one: Stood,
  where: string,
  moving: boolean,
  postures: Iterable<readonly number[]>,
  solids: readonly Solid[],
  workedOn: string | null,
  all: readonly Stood[],
): ClearanceRow | null {
  const toSolid = nothingNear();
  const prisms = solids.map(({ prism }) => prism);
  // On a move the tool leaves one fixture and comes to another; how it does so is not this study's business.
  const skip = solids.findIndex(({ itemId }) => itemId === workedOn);
  const others = all.filter((other) => other !== one);
  let toRobot: { near: Nearest; other: Stood } | null = null;
  for (const posture of postures) {
    standLinks(one.chain, posture, one.links);
    if (!moving) linksToPrisms(one.links, prisms, skip, toSolid);
    else linksToPrisms(withoutTool(one.links), prisms, -1, toSolid);
    for (const other of others) {
      for (const held of other.held) {
        const near = linksToLinks(one.links, held, nothingNear());
        if (toRobot === null || near.distance < toRobot.near.distance) toRobot = { near, other };
      }
    }
  }
  const part = (link: number): string => (link === one.links.count - 1 ? 'tool' : `link ${link}`);
  if (toRobot && toRobot.near.distance < toSolid.distance) {
    const { near, other } = toRobot;
    const { robot } = other.source;
    const base = { where, moving, part: part(near.link), other: robot.name, otherId: robot.id };
    return { ...base, distanceMm: near.distance * 1000 };
  }
  if (toSolid.index < 0) return null;
  const { name, itemId } = solids[toSolid.index];
  return { where, moving, part: part(toSolid.link), other: name, otherId: itemId, distanceMm: toSolid.distance * 1000 };
}

const withoutTool = (links: Links): Links => ({ ...links, count: links.count - 1 });

/** Every posture of a robot's work, those along its moves included; none without a robot. */
export function wayPostures(working: WorkingRobot | undefined): (readonly number[])[] {
  if (!working) return [];
  const stood = standRobot(working);
  return working.postures.flatMap((posture, index) => {
    const next = working.postures[index + 1];
    return [posture.joints, ...(next ? wayBetween(stood, posture, next) : [])];
  });
}

/** Postures along a move in joint space, close enough together that no part of the arm comes farther than MOVE_STEP_MM. */
function* wayBetween({ chain, reachM }: Stood, from: WorkPosture, to: WorkPosture): Generator<readonly number[]> {
  const way = from.joints.map((value, k) => {
    const change = Math.abs(to.joints[k] - value);
    // A turn carries what hangs behind it no farther than its angle times the reach.
    return chain.prismatic[k] && !chain.coupling ? change : change * reachM;
  });
  const steps = Math.min(
    2000,
    Math.max(1, Math.ceil((way.reduce((sum, part) => sum + part, 0) * 1000) / MOVE_STEP_MM)),
  );
  for (let step = 1; step < steps; step += 1) {
    yield from.joints.map((value, k) => value + ((to.joints[k] - value) * step) / steps);
  }
}
