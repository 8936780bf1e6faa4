import { makeSpotReader, type SpotPosture } from '@/lib/kinematics/spot';
import type { Arm, MapDirection, Target, Vec3, WristMode } from '@/lib/kinematics/types';
import { velocityOutlines, type VelocityOutline } from '@/lib/kinematics/velocity-outline';
import { turned } from '@/lib/layout/geometry';
import type { Item, Robot } from '@/lib/layout/items';
import { mapRequestOf, questionOfRobot } from '@/lib/layout/map-question';
import type { MapSettings } from '@/lib/layout/map-settings';
import { armWithTool, baseToFloor, floorToBase } from '@/lib/layout/robot-frame';
import { floorTaskPoints, targetInBase, type FloorTaskPoint } from '@/lib/layout/task-points';
import { shortfallWords } from '@/lib/layout/verdict-words';

/** A spot that the plumb hangs over: anywhere on the floor with the sheet's tool pose, or a task point with its own. */
export interface PlumbSpot {
  readonly positionMm: readonly [number, number, number];
  readonly taskPoint: FloorTaskPoint | null;
}

export function plumbOnFloor(spot: { xMm: number; yMm: number }, settings: MapSettings): PlumbSpot {
  return { positionMm: [spot.xMm, spot.yMm, settings.toolHeightMm], taskPoint: null };
}

export function plumbOnTaskPoint(items: readonly Item[], taskPointId: string): PlumbSpot | null {
  const taskPoint = floorTaskPoints(items).find(({ point }) => point.id === taskPointId);
  return taskPoint ? { positionMm: taskPoint.positionMm, taskPoint } : null;
}

/** One posture at the spot, in the sheet's units: mm, m/s and plain joint numbers from 1. */
export interface PlumbPosture {
  /** Class of branch in words; '' where the chain has none. */
  readonly branch: string;
  readonly joints: readonly number[];
  readonly inverseConditionNumber: number | null;
  readonly maximumToolSpeed: number | null;
  readonly sureSpeed: number | null;
  readonly limit: { readonly joint: number; readonly words: string };
  /** The joint whose speed limit sets the sure speed; null where no single one does. */
  readonly bindingJoint: number | null;
  /** Base, joint origins, flange, tool point: over the floor, mm. */
  readonly skeletonMm: readonly (readonly [number, number, number])[];
}

export interface PlumbReading {
  readonly robot: Robot;
  readonly spot: PlumbSpot;
  /** The arm with its tool, in the base frame. */
  readonly arm: Arm;
  /** Level direction from the base to the spot, floor frame. */
  readonly headingDeg: number;
  /** Best first; empty where the spot is not reached. */
  readonly postures: readonly PlumbPosture[];
  /** Why it is not reached, as a sentence; null where it is. */
  readonly refusal: string | null;
}

/** Reads everything at a spot for one robot. */
export function readPlumb(robot: Robot, definition: Arm, spot: PlumbSpot, settings: MapSettings): PlumbReading {
  const arm = armWithTool(definition, robot.tool);
  const target = spot.taskPoint
    ? targetInBase({ rollDeg: spot.taskPoint.point.rollDeg, pose: spot.taskPoint.pose }, robot)
    : targetOf(robot, definition, spot, settings);
  const reading = makeSpotReader(arm, settings.wrist)(target);
  const joint = reading.joint < 0 ? null : reading.joint + 1;
  const prismatic = joint !== null && arm.joints[reading.joint]?.type === 'prismatic';
  return {
    robot,
    spot,
    arm,
    headingDeg: headingDeg(robot, spot),
    postures: reading.postures.map((posture) => told(posture, robot, arm, settings.wrist)),
    refusal: reading.reached ? null : shortfallWords({ reason: reading.reason, joint, prismatic, by: reading.by }),
  };
}

/** The robot that reads best at a spot: conditioned best, else the nearest one. Null without robots. */
export function bestPlumb(readings: readonly PlumbReading[]): PlumbReading | null {
  const distance = ({ robot, spot }: PlumbReading) =>
    Math.hypot(robot.xMm - spot.positionMm[0], robot.yMm - spot.positionMm[1]);
  const worth = ({ postures }: PlumbReading) => postures[0]?.inverseConditionNumber ?? (postures.length > 0 ? 0 : -1);
  return [...readings].sort((one, other) => worth(other) - worth(one) || distance(one) - distance(other))[0] ?? null;
}

/** The floor's tool pose at a spot in the base frame, the same as the map of this robot takes it there. */
function targetOf(robot: Robot, definition: Arm, spot: PlumbSpot, settings: MapSettings): Target {
  const { request } = mapRequestOf(questionOfRobot(robot, settings), definition);
  const [x, y, z] = floorToBase(robot, spot.positionMm).map((mm) => mm / 1000);
  const [baseX, baseY] = definition.base?.xyz ?? [0, 0, 0];
  return { position: [x, y, z], direction: directionAt(request.direction, x - baseX, y - baseY), roll: request.roll };
}

function directionAt(direction: MapDirection, x: number, y: number): Vec3 {
  if (direction.kind === 'down') return [0, 0, -1];
  if (direction.kind === 'vector') return direction.vector;
  const radius = Math.hypot(x, y);
  const level = Math.cos(direction.tilt);
  return radius > 0
    ? [(x / radius) * level, (y / radius) * level, Math.sin(direction.tilt)]
    : [level, 0, Math.sin(direction.tilt)];
}

function headingDeg(robot: Robot, { positionMm: [x, y] }: PlumbSpot): number {
  return (Math.atan2(y - robot.yMm, x - robot.xMm) * 180) / Math.PI;
}

function told(spot: SpotPosture, robot: Robot, arm: Arm, wrist: WristMode): PlumbPosture {
  const measures = wrist === 'held' ? spot.wristHeld : spot.wristFree;
  const { joint, angle } = spot.limitMargin;
  const prismatic = arm.joints[joint]?.type === 'prismatic';
  return {
    branch: spot.branch,
    joints: spot.posture,
    inverseConditionNumber: measures.inverseConditionNumber,
    maximumToolSpeed: measures.maximumToolSpeed,
    sureSpeed: measures.sureSpeed,
    limit: {
      joint: joint + 1,
      words: prismatic ? `${Math.round(angle * 1000)} mm` : `${Math.round((angle * 180) / Math.PI)}°`,
    },
    bindingJoint: wrist === 'held' && spot.bindingJoint >= 0 ? spot.bindingJoint + 1 : null,
    skeletonMm: spot.skeleton.map(([x, y, z]) => baseToFloor(robot, [x * 1000, y * 1000, z * 1000])),
  };
}

/** What the tool can do at the spot in a plane through it, m/s. */
export interface SpeedShape {
  readonly polygon: readonly (readonly [number, number])[];
  readonly ellipse: { readonly major: number; readonly minor: number; readonly angleDeg: number };
}

/** On the floor along its x and y, and upright along the heading of the plumb and up. */
export interface PlumbSpeeds {
  readonly floor: SpeedShape;
  readonly upright: SpeedShape;
}

export function plumbSpeeds(
  { arm, robot, headingDeg: heading }: PlumbReading,
  posture: PlumbPosture,
  wrist: WristMode,
): PlumbSpeeds {
  const headingInBase = ((heading - robot.angleDeg) * Math.PI) / 180;
  const { floor, upright } = velocityOutlines(arm, posture.joints, wrist, headingInBase);
  const shape = ({ polygon, ellipse }: VelocityOutline, turnDeg: number): SpeedShape => ({
    polygon: polygon.map((point) => turned(point, turnDeg)),
    ellipse: {
      major: ellipse.major,
      minor: ellipse.minor,
      angleDeg: (ellipse.angleRad * 180) / Math.PI + turnDeg,
    },
  });
  return { floor: shape(floor, robot.angleDeg), upright: shape(upright, 0) };
}
