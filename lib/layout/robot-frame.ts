import { identityTransform, invertTransform, multiplyTransforms, transformOf } from '@/lib/kinematics/transforms';
import type { Transform } from '@/lib/kinematics/transforms';
import type { Arm, Frame, Vec3 } from '@/lib/kinematics/types';
import { floorToItem, itemToFloor, turned, type Placement } from './geometry';
import type { Robot, Tool } from './items';
import { frameOf } from './tool-orientation';

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
  const flange = arm.tool;
  // Taken over as it is: a way through sines and back would change its last digits, and with them the key of a map.
  if (flange === undefined || isIdentity(flange)) return { ...arm, tool: toolFrame(tool) };
  const toolPoint = multiplyTransforms(transformOf(flange), transformOf(toolFrame(tool)), identityTransform());
  return { ...arm, tool: frameOf(toolPoint) };
}

function isIdentity({ xyz, rpy }: Frame): boolean {
  return [...xyz, ...rpy].every((value) => value === 0);
}

/** An item's own frame in the floor frame (m), its origin lifted by `zMm`. */
export function frameOnFloor(placement: Placement, zMm = 0): Transform {
  return transformOf({
    xyz: [placement.xMm / 1000, placement.yMm / 1000, zMm / 1000],
    rpy: [0, 0, radians(placement.angleDeg)],
  });
}

/** A pose of the floor frame (m), in the base frame. */
export function poseInBase(base: BasePlacement, onFloor: Transform): Transform {
  const toBase = invertTransform(frameOnFloor(base, base.riserMm), identityTransform());
  return multiplyTransforms(toBase, onFloor, toBase);
}

export function baseToFloor(base: BasePlacement, [xMm, yMm, zMm]: Point3Mm): [number, number, number] {
  return [...itemToFloor(base, [xMm, yMm]), zMm + base.riserMm];
}

export function floorToBase(base: BasePlacement, [xMm, yMm, zMm]: Point3Mm): [number, number, number] {
  return [...floorToItem(base, [xMm, yMm]), zMm - base.riserMm];
}

/** A direction of the floor frame, in the base frame. */
export function directionToBase(base: Placement, [x, y, z]: Vec3): [number, number, number] {
  return [...turned([x, y], -base.angleDeg), z];
}

/** A direction of the base frame, in the floor frame. */
export function directionToFloor(base: Placement, [x, y, z]: Vec3): [number, number, number] {
  return [...turned([x, y], base.angleDeg), z];
}
