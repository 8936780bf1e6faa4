import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import type { Arm, Joint } from '@/lib/kinematics/types';
import { armHeightsMm, armReachMm } from './arm-reach';
import { reachRadius } from './reach-radius';

const joint = (part: Partial<Joint>): Joint => ({
  type: 'revolute',
  a: 0,
  alpha: 0,
  d: 0,
  theta: 0,
  min: -Math.PI,
  max: Math.PI,
  maxSpeed: 1,
  maxAcceleration: 1,
  ...part,
});
const arm = (joints: Joint[], rest: Partial<Arm> = {}): Arm => ({ convention: 'standard', joints, ...rest });
const builtIn = (slug: string): Arm => BUILT_IN_ARMS.find((entry) => entry.slug === slug)!.arm;

describe('armReachMm', () => {
  // By hand from the data of lib/kinematics/library: shoulder + upper arm + √(elbow² + forearm²), all stretched level.
  it.each([
    ['six-axis-6kg', 50 + 430 + Math.hypot(35, 420)],
    ['six-axis-12kg', 150 + 620 + Math.hypot(120, 630)],
    ['six-axis-90kg', 320 + 1150 + Math.hypot(200, 1220)],
    ['scara-5kg', 325 + 275],
  ])('of %s is what its name says', (slug, reach) => {
    expect(armReachMm(builtIn(slug))).toBeCloseTo(reach, 3);
  });

  it('is never above the bound that map grids are laid out by', () => {
    for (const { arm: each } of BUILT_IN_ARMS)
      expect(armReachMm(each)).toBeLessThanOrEqual(1000 * reachRadius(each) + 1e-6);
  });

  // Two links of 0.5 and 0.4 m: the law of cosines with the elbow kept from stretching.
  it('respects a limit that keeps the elbow bent', () => {
    const bent = Math.PI / 3;
    const planar = arm([joint({ a: 0.5 }), joint({ a: 0.4, min: bent, max: 2 })]);
    expect(armReachMm(planar)).toBeCloseTo(1000 * Math.sqrt(0.25 + 0.16 + 2 * 0.5 * 0.4 * Math.cos(bent)), 3);
  });

  it('finds a narrow stretched posture in the corner of both ranges', () => {
    const planar = arm([
      joint({ a: 0.5 }),
      joint({ a: 0.4, min: -3, max: 0.001 }),
      joint({ a: 0.3, min: -0.001, max: 3 }),
    ]);
    expect(armReachMm(planar)).toBeCloseTo(1200, 3);
  });

  it('counts the travel where the first joint slides', () => {
    const half = Math.PI / 2;
    // Axis 1 is laid level along x by the base; behind it an upright axis with one link of 0.7 m.
    const track = arm([joint({ type: 'prismatic', min: 0, max: 2, alpha: -half, theta: half }), joint({ a: 0.7 })], {
      base: { xyz: [0, 0, 0], rpy: [0, 0, 0] },
    });
    // Travel along z here: it lifts and does not carry outward.
    expect(armReachMm(track)).toBeCloseTo(700, 3);
  });

  it('does not change with the way the base stands', () => {
    const floor = builtIn('six-axis-12kg');
    const wall: Arm = { ...floor, base: { xyz: [0.3, -0.2, 1], rpy: [0, Math.PI / 2, 0.4] } };
    expect(armReachMm(wall)).toBeCloseTo(armReachMm(floor), 3);
  });

  it('obeys the joints’ own limits under a coupling', () => {
    // The second actuator holds the forearm to the floor: q2 = u2 − u1.
    const coupled = arm([joint({ a: 0.5, min: -1, max: 1 }), joint({ a: 0.4, min: 0.5, max: 2 })], {
      coupling: [
        [1, 0],
        [-1, 1],
      ],
      actuators: [
        { min: -1, max: 1, maxSpeed: 1, maxAcceleration: 1 },
        { min: -3, max: 3, maxSpeed: 1, maxAcceleration: 1 },
      ],
    });
    expect(armReachMm(coupled)).toBeCloseTo(1000 * Math.sqrt(0.25 + 0.16 + 0.4 * Math.cos(0.5)), 3);
  });

  it('is nothing for a chain that only turns on the spot', () => {
    expect(armReachMm(arm([joint({ d: 0.3 })]))).toBe(0);
  });
});

describe('armHeightsMm', () => {
  it('spans a six-axis arm from below its base to straight above its shoulder', () => {
    const { topMm, bottomMm } = armHeightsMm(builtIn('six-axis-12kg'));
    // Column plus both links stretched straight up: joint 2 may stand at −90°, so nothing keeps it from that.
    expect(topMm).toBeCloseTo(450 + 620 + Math.hypot(120, 630), 3);
    expect(bottomMm).toBeLessThan(0);
  });
});
