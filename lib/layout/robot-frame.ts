import type { Arm, Frame, Vec3 } from '@/lib/kinematics/types';
import { floorToItem, itemToFloor, turned, type Placement, type PointMm } from './geometry';
import type { Robot, Tool } from './items';
import { frameOf, matrixOf, multiply, turn, type Matrix3 } from './rotation';

/**
 * A robot's base frame: origin in the middle of its base plate, on top of the riser, x out of the base, z up. The arm, its
 * maps and its postures live there; the floor only enters by the place and turn of the base.
 */

export type BasePlacement = Placement & Pick<Robot, 'riserMm'>;
export type Point3Mm = readonly [number, number, number];

/** The tool as far as it moves the tool point. */
export type ToolOffset = Pick<Tool, 'xMm' | 'yMm' | 'zMm' | 'rollDeg' | 'pitchDeg' | 'yawDeg'>;

const radians = (degrees: number): number => (degrees * Math.PI) / 180;

/** Flange to tool point (m, rad): an offset and a rotation about the flange's fixed x, then y, then z. */
export function toolFrame(tool: ToolOffset): Frame {
  return {
    xyz: [tool.xMm / 1000, tool.yMm / 1000, tool.zMm / 1000],
    rpy: [radians(tool.rollDeg), radians(tool.pitchDeg), radians(tool.yawDeg)],
  };
}

/** The arm with a tool on its flange, in its base frame. A tool transform of the library arm is its flange. */
export function armWithTool(arm: Arm, tool: ToolOffset): Arm {
  return { ...arm, tool: composed(arm.tool, toolFrame(tool)) };
}

/** One transform after another: `inner` is given in the frame that `outer` describes. */
function composed(outer: Frame | undefined, inner: Frame): Frame {
  // Taken over as it is: a way through sines and back would change its last digits, and with them the key of a map.
  if (outer === undefined || isIdentity(outer)) return inner;
  const rotation = matrixOf(outer.rpy);
  const [x, y, z] = turn(rotation, inner.xyz);
  return frameOf([outer.xyz[0] + x, outer.xyz[1] + y, outer.xyz[2] + z], multiply(rotation, matrixOf(inner.rpy)));
}

function isIdentity({ xyz, rpy }: Frame): boolean {
  return [...xyz, ...rpy].every((value) => value === 0);
}

export function baseToFloor(base: BasePlacement, [xMm, yMm, zMm]: Point3Mm): [number, number, number] {
  return [...itemToFloor(base, [xMm, yMm]), zMm + base.riserMm];
}

export function floorToBase(base: BasePlacement, [xMm, yMm, zMm]: Point3Mm): [number, number, number] {
  return [...floorToItem(base, [xMm, yMm]), zMm - base.riserMm];
}

/** A direction of the floor frame, in the base frame. */
export function directionToBase(base: Placement, [x, y, z]: Vec3): [number, number, number] {
  return [...turned([x, y] as PointMm, -base.angleDeg), z];
}

/** A direction of the base frame, in the floor frame. */
export function directionToFloor(base: Placement, [x, y, z]: Vec3): [number, number, number] {
  return [...turned([x, y] as PointMm, base.angleDeg), z];
}

/** A rotation given in an item's frame, in the frame that the item is turned in by `angleDeg`. */
export function rotationOutOf(angleDeg: number, rotation: Matrix3): Matrix3 {
  return multiply(matrixOf([0, 0, radians(angleDeg)]), rotation);
}
