import { describe, expect, it } from 'vitest';
import { compileChain, forward, makeStance } from '@/lib/kinematics/chain';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import { multiplyTransforms } from '@/lib/kinematics/transforms';
import type { Arm } from '@/lib/kinematics/types';
import { robotSchema, type Robot } from './items';
import { finestStepMm, gridInMm, mapRequestOf, questionOfRobot } from './map-question';
import { mapQuestionSchema } from './map-question-schema';
import { mapSettingsSchema } from './map-settings';
import { reachRadius } from './reach-radius';
import { frameOnFloor } from './robot-frame';
import { toolDirection, toolOrientation } from './tool-orientation';

const link = { min: -Math.PI, max: Math.PI, maxSpeed: 1, maxAcceleration: 1, type: 'revolute', theta: 0 } as const;
/** Upright first axis, then two links in a vertical plane. */
const elbowArm: Arm = {
  convention: 'standard',
  joints: [
    { ...link, a: 0.15, alpha: Math.PI / 2, d: 0.45 },
    { ...link, a: 0.6, alpha: 0, d: 0 },
    { ...link, a: 0, alpha: 0, d: 0.64 },
  ],
};

function robotAt(xMm: number, angleDeg: number, riserMm = 300): Robot {
  return robotSchema.parse({
    kind: 'robot',
    id: '3b6b34a5-2c5e-4d8e-9d5c-0f6a5b1c2d3e',
    name: 'R1',
    xMm,
    yMm: 0,
    angleDeg,
    armId: '7d1c2f52-6d0f-4d0b-a8a3-5b7f3e1f9a10',
    riserMm,
    tool: { zMm: 150 },
  });
}
const settings = (change: object) => mapSettingsSchema.parse(change);

describe('the question of a robot', () => {
  it('is the same wherever the base stands', () => {
    for (const change of [{}, { tiltDeg: 40, towards: 'outward' }, { tiltDeg: 180, rollDeg: 'free' }]) {
      const question = questionOfRobot(robotAt(0, 0), settings(change));
      expect(questionOfRobot(robotAt(4321, 123.4), settings(change))).toEqual(question);
      expect(() => mapQuestionSchema.parse(question)).not.toThrow();
    }
  });

  it('counts the height from the base plate, without rounding noise', () => {
    expect(questionOfRobot(robotAt(0, 0, 300.3), settings({ toolHeightMm: 850.1 })).toolHeightMm).toBe(549.8);
  });

  it('turns a heading of the floor into one of the base', () => {
    const { headingDeg } = questionOfRobot(
      robotAt(0, 120),
      settings({ tiltDeg: 90, towards: 'heading', headingDeg: -90 }),
    );
    expect(headingDeg).toBe(150);
  });

  it('does not carry a heading that changes nothing', () => {
    const question = questionOfRobot(robotAt(0, 0), settings({ towards: 'heading', headingDeg: 45 }));
    expect(question).toEqual(questionOfRobot(robotAt(0, 0), settings({ towards: 'outward', headingDeg: 0 })));
  });

  it('states a fixed roll against the base, so that the tool lies the same on the floor', () => {
    for (const [tiltDeg, headingDeg, rollDeg, angleDeg] of [
      [0, 0, 10, 35],
      [60, 20, -130, 275],
      [90, 15, 90, -60],
    ]) {
      const question = questionOfRobot(
        robotAt(0, angleDeg),
        settings({ tiltDeg, towards: 'heading', headingDeg, rollDeg }),
      );
      const radians = (degrees: number): number => (degrees * Math.PI) / 180;
      const roll = radians(Number(question.settings.rollDeg));
      const inBase = toolOrientation(toolDirection(tiltDeg, question.headingDeg), roll);
      const turn = frameOnFloor({ xMm: 0, yMm: 0, angleDeg });
      const onFloor = multiplyTransforms(turn, inBase, turn);
      const wanted = toolOrientation(toolDirection(tiltDeg, headingDeg), radians(rollDeg));
      onFloor.forEach((value, index) => expect(value).toBeCloseTo(wanted[index], 7));
    }
  });
});

describe('what the kernel is asked', () => {
  it('covers the whole reach with a square grid that has a cell on the base', () => {
    const { arm, request } = mapRequestOf(questionOfRobot(robotAt(0, 0), settings({ stepMm: 40 })), elbowArm);
    // 0.15 + 0.6 + 0.64 of links and 0.15 of tool; the 0.45 up the first axis carry nothing outward.
    expect(reachRadius(arm)).toBeCloseTo(1.54, 12);
    expect(request.grid).toEqual({ origin: [-1.56, -1.56], step: 0.04, columns: 79, rows: 79 });
    expect(gridInMm(request.grid)).toEqual({ originMm: [-1560, -1560], stepMm: 40, columns: 79, rows: 79 });
    expect(request.toolHeight).toBeCloseTo(0.55, 12);
    expect(request.direction).toEqual({ kind: 'down' });
    expect(request.roll).toBe('free');
  });

  it('counts an outward tilt from the horizontal', () => {
    const question = questionOfRobot(robotAt(0, 0), settings({ tiltDeg: 60, towards: 'outward' }));
    expect(mapRequestOf(question, elbowArm).request.direction).toEqual({
      kind: 'outward',
      tilt: expect.closeTo(-Math.PI / 6, 12),
    });
  });

  it('leaves a quill out of the reach of an arm that stays upright', () => {
    const scara: Arm = {
      convention: 'modified',
      joints: [
        { ...link, a: 0, alpha: 0, d: 0.3 },
        { ...link, a: 0.35, alpha: 0, d: 0 },
        { ...link, type: 'prismatic', a: 0.25, alpha: Math.PI, d: 0, min: 0, max: 0.2 },
        { ...link, a: 0, alpha: 0, d: 0.1 },
      ],
      tool: { xyz: [0.03, 0.04, 0.2], rpy: [0, 0, 0] },
    };
    expect(reachRadius(scara)).toBeCloseTo(0.35 + 0.25 + 0.05, 12);
  });

  it('is never smaller than where any posture puts the tool point', () => {
    // A generator of our own (Lehmer's minimal standard), so that a failure can be repeated.
    let seed = 20251201;
    const chance = (): number => (seed = (seed * 48271) % 2147483647) / 2147483647;
    for (const { arm: bare } of BUILT_IN_ARMS) {
      const arm = { ...bare, tool: { xyz: [0.05, -0.03, 0.2], rpy: [0.2, 0.4, 0] } as const };
      const chain = compileChain(arm);
      const stance = makeStance(chain);
      let farthest = 0;
      for (let count = 0; count < 5000; count += 1) {
        const posture = (arm.actuators ?? arm.joints).map(({ min, max }) => min + (max - min) * chance());
        const { tool } = forward(chain, posture, stance);
        farthest = Math.max(farthest, Math.hypot(tool[3], tool[7]));
      }
      expect(farthest).toBeLessThanOrEqual(reachRadius(arm));
      expect(farthest).toBeGreaterThan(0.85 * reachRadius(arm));
    }
  });

  it('names the finest step that a limit allows', () => {
    const stepMm = finestStepMm(elbowArm, 10_000);
    const spots = (step: number): number => (2 * Math.ceil(1390 / step) + 1) ** 2;
    expect(spots(stepMm)).toBeLessThanOrEqual(10_000);
    expect(spots(stepMm - 1)).toBeGreaterThan(10_000);
  });
});
