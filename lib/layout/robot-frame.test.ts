import { describe, expect, it } from 'vitest';
import { identityTransform, multiplyTransforms, transformOf } from '@/lib/kinematics/transforms';
import type { Arm, Frame } from '@/lib/kinematics/types';
import { robotSchema } from './items';
import {
  armWithTool,
  baseToFloor,
  directionToBase,
  directionToFloor,
  floorToBase,
  poseInBase,
  toolFrame,
} from './robot-frame';
import { rollOf, toolDirection, toolOrientation } from './tool-orientation';

const robot = robotSchema.parse({
  kind: 'robot',
  id: '3b6b34a5-2c5e-4d8e-9d5c-0f6a5b1c2d3e',
  name: 'R1',
  xMm: 2000,
  yMm: -500,
  angleDeg: 90,
  armId: '7d1c2f52-6d0f-4d0b-a8a3-5b7f3e1f9a10',
  riserMm: 300,
});

const bareArm: Arm = { convention: 'standard', joints: [] };

describe('base frame and floor frame', () => {
  it('puts a point out in front of a turned base away on the floor, above its riser', () => {
    expect(baseToFloor(robot, [1000, 0, 550])).toEqual([expect.closeTo(2000), expect.closeTo(500), 850]);
  });

  it('comes back', () => {
    const point = [123.4, -567.8, 901.2] as const;
    const back = floorToBase(robot, baseToFloor(robot, point));
    back.forEach((value, axis) => expect(value).toBeCloseTo(point[axis], 9));
    const direction = directionToFloor(robot, directionToBase(robot, [0.6, 0, -0.8]));
    [0.6, 0, -0.8].forEach((value, axis) => expect(direction[axis]).toBeCloseTo(value, 12));
  });

  it('agree about poses', () => {
    const pose = transformOf({ xyz: [2, 0.5, 0.85], rpy: [Math.PI, 0, 0] });
    const inBase = poseInBase(robot, pose);
    [1, 0, 0.55].forEach((value, axis) => expect(inBase[4 * axis + 3]).toBeCloseTo(value, 12));
    expect([inBase[2], inBase[6], inBase[10]]).toEqual([expect.closeTo(0), expect.closeTo(0), -1]);
  });
});

describe('the tool on the flange', () => {
  it('is given in metres and radians', () => {
    expect(toolFrame({ xMm: 10, yMm: 20, zMm: 150, rollDeg: 0, pitchDeg: 90, yawDeg: 0 })).toEqual({
      xyz: [0.01, 0.02, 0.15],
      rpy: [0, Math.PI / 2, 0],
    });
  });

  it.each<[string, Frame, number]>([
    ['anyhow', { xyz: [0.02, 0, 0.1], rpy: [0.3, -0.7, 1.1] }, 35],
    ['along a singular pitch', { xyz: [0, 0, 0], rpy: [0, Math.PI / 2, 0] }, 0],
  ])('sits on the flange that the library arm describes, turned %s', (_, flange, pitchDeg) => {
    const tool = { xMm: 50, yMm: -20, zMm: 200, rollDeg: 20, pitchDeg, yawDeg: -60 };
    const wanted = multiplyTransforms(transformOf(flange), transformOf(toolFrame(tool)), identityTransform());
    const found = transformOf(armWithTool({ ...bareArm, tool: flange }, tool).tool);
    found.forEach((value, index) => expect(value).toBeCloseTo(wanted[index], 12));
  });

  it('keeps its digits where the arm has no flange of its own', () => {
    const tool = { xMm: 0.1, yMm: 0.2, zMm: 0.3, rollDeg: 0.7, pitchDeg: 0, yawDeg: 0 };
    expect(armWithTool(bareArm, tool).tool).toEqual(toolFrame(tool));
  });
});

describe('tool directions', () => {
  it('are exact at the right angles', () => {
    expect(toolDirection(0, 0).map((value) => value + 0)).toEqual([0, 0, -1]);
    expect(toolDirection(180, 33).map((value) => value + 0)).toEqual([0, 0, 1]);
    expect(toolDirection(90, -90).map((value) => value + 0)).toEqual([0, -1, 0]);
  });

  it('straight down with roll 0 is the rotation of the analyse contract', () => {
    const axes = toolOrientation([0, 0, -1], 0);
    expect(Array.from(axes, (value) => value + 0)).toEqual([1, 0, 0, 0, 0, -1, 0, 0, 0, 0, -1, 0]);
  });

  it('give their roll back', () => {
    for (const [tilt, azimuth, roll] of [
      [0, 0, 1.2],
      [35, 140, -2.9],
      [90, 0, 0.4],
      [117, -71, 3],
    ]) {
      expect(rollOf(toolOrientation(toolDirection(tilt, azimuth), roll))).toBeCloseTo(roll, 9);
    }
  });
});
