import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import type { Arm } from '@/lib/kinematics/types';
import { armDifferences, type ComparedArm } from './arm-differences';

const base: ComparedArm = {
  name: 'Arm',
  description: 'For welding',
  payloadKg: 12,
  definition: BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-12kg')!.arm,
};
const changed = (definition: Partial<Arm>): ComparedArm => ({
  ...base,
  definition: { ...base.definition, ...definition },
});
const DEGREE = Math.PI / 180;

describe('armDifferences', () => {
  it('says nothing of two that are the same', () => {
    expect(armDifferences(base, structuredClone(base))).toEqual([]);
  });

  it('tells name, payload and description', () => {
    expect(armDifferences(base, { ...base, name: 'Arm B', payloadKg: null, description: '' })).toEqual([
      'Name: Arm → Arm B.',
      'The description reads differently.',
      'Payload: 12 kg → none.',
    ]);
  });

  it('tells each joint’s figures with their units', () => {
    const joints = base.definition.joints.map((joint, index) =>
      index === 2 ? { ...joint, a: 0.125, max: 80 * DEGREE, maxSpeed: 170 * DEGREE } : joint,
    );
    expect(armDifferences(base, changed({ joints }))).toEqual([
      'Joint 3: a 120 mm → 125 mm, to 75° → 80°, speed 166 °/s → 170 °/s.',
    ]);
    const nudged = joints.map((joint, index) =>
      index === 2 ? { ...base.definition.joints[2], a: 0.120000001 } : joint,
    );
    expect(armDifferences(base, changed({ joints: nudged }))).toEqual(['Joint 3: a by less than a thousandth.']);
  });

  it('tells joints that come, go and change their kind', () => {
    const { joints } = base.definition;
    expect(armDifferences(base, changed({ joints: [...joints, joints[0]] }))).toEqual(['Joint 7 is new.']);
    expect(armDifferences(base, changed({ joints: joints.slice(0, 5) }))).toEqual(['Joint 6 is gone.']);
    const slides = joints.map((joint, index) => (index === 0 ? { ...joint, type: 'prismatic' as const } : joint));
    expect(armDifferences(base, changed({ joints: slides }))).toEqual(['Joint 1 slides now, before it turns.']);
  });

  it('tells convention, tool and coupling', () => {
    const tool = { xyz: [0, 0, 0.1], rpy: [0, 90 * DEGREE, 0] } as const;
    expect(armDifferences(base, changed({ convention: 'modified', tool }))).toEqual([
      'Convention: standard → modified.',
      'Tool: none → 0 0 100 mm, 0° 90° 0°.',
    ]);
    expect(armDifferences(base, changed({ coupling: [[1]] }))).toEqual(['The joints are coupled now.']);
  });
});
