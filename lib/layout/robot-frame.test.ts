import { describe, expect, it } from 'vitest';
import type { Arm } from '@/lib/kinematics/types';
import { robotSchema } from './items';
import { armWithTool, baseToFloor, directionToBase, directionToFloor, floorToBase, toolFrame } from './robot-frame';
import { matrixOf, multiply, rollOf, toolDirection, toolRotation, turn } from './rotation';

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
});

describe('the tool on the flange', () => {
  it('is given in metres and radians', () => {
    expect(toolFrame({ xMm: 10, yMm: 20, zMm: 150, rollDeg: 0, pitchDeg: 90, yawDeg: 0 })).toEqual({
      xyz: [0.01, 0.02, 0.15],
      rpy: [0, Math.PI / 2, 0],
    });
  });

  it('sits on the flange that the library arm describes', () => {
    const flange = { xyz: [0, 0, 0.1], rpy: [0.3, -0.7, 1.1] } as const;
    const tool = { xMm: 50, yMm: -20, zMm: 200, rollDeg: 20, pitchDeg: 35, yawDeg: -60 };
    const { xyz, rpy } = armWithTool({ ...bareArm, tool: flange }, tool).tool!;
    const inner = toolFrame(tool);
    const turnedOffset = turn(matrixOf(flange.rpy), inner.xyz);
    turnedOffset.forEach((value, axis) => expect(xyz[axis]).toBeCloseTo(flange.xyz[axis] + value, 12));
    const wanted = multiply(matrixOf(flange.rpy), matrixOf(inner.rpy));
    matrixOf(rpy).forEach((row, i) => row.forEach((value, j) => expect(value).toBeCloseTo(wanted[i][j], 12)));
  });

  it('keeps its digits where the arm has no flange of its own', () => {
    const tool = { xMm: 0.1, yMm: 0.2, zMm: 0.3, rollDeg: 0.7, pitchDeg: 0, yawDeg: 0 };
    expect(armWithTool(bareArm, tool).tool).toEqual(toolFrame(tool));
  });

  it('can look along a singular pitch', () => {
    const flange = { xyz: [0, 0, 0], rpy: [0, Math.PI / 2, 0] } as const;
    const tool = { xMm: 0, yMm: 0, zMm: 0, rollDeg: 25, pitchDeg: 0, yawDeg: 0 };
    const wanted = multiply(matrixOf(flange.rpy), matrixOf(toolFrame(tool).rpy));
    const { rpy } = armWithTool({ ...bareArm, tool: flange }, tool).tool!;
    matrixOf(rpy).forEach((row, i) => row.forEach((value, j) => expect(value).toBeCloseTo(wanted[i][j], 12)));
  });
});

describe('tool directions', () => {
  it('are exact at the right angles', () => {
    expect(toolDirection(0, 0).map((value) => value + 0)).toEqual([0, 0, -1]);
    expect(toolDirection(180, 33).map((value) => value + 0)).toEqual([0, 0, 1]);
    expect(toolDirection(90, -90).map((value) => value + 0)).toEqual([0, -1, 0]);
  });

  it('straight down with roll 0 is the rotation of the analyse contract', () => {
    const rows = toolRotation([0, 0, -1], 0).map((row) => row.map((value) => value + 0));
    expect(rows).toEqual([
      [1, 0, 0],
      [0, -1, 0],
      [0, 0, -1],
    ]);
  });

  it('give their roll back', () => {
    for (const [tilt, azimuth, roll] of [
      [0, 0, 1.2],
      [35, 140, -2.9],
      [90, 0, 0.4],
      [117, -71, 3],
    ]) {
      expect(rollOf(toolRotation(toolDirection(tilt, azimuth), roll))).toBeCloseTo(roll, 9);
    }
  });
});
