import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import { armSchema } from './arm';

const DEGREE = Math.PI / 180;
const [{ arm }] = BUILT_IN_ARMS;
type Joints = typeof arm.joints;

/** The first thing that is wrong, as path and words; null where nothing is. */
function refusal(candidate: unknown): { path: string; message: string } | null {
  const checked = armSchema.safeParse(candidate);
  if (checked.success) return null;
  const [{ path, message }] = checked.error.issues;
  return { path: path.join('.'), message };
}
const withJoint = (index: number, change: Record<string, unknown>) => ({
  ...arm,
  joints: arm.joints.map((joint, i) => (i === index ? { ...joint, ...change } : joint)),
});
const repeated = (count: number): Joints => Array.from({ length: count }, () => arm.joints[0]);

describe('an arm at the edge', () => {
  it.each(BUILT_IN_ARMS.map((builtIn) => [builtIn.name, builtIn.arm] as const))('%s passes unchanged', (_, builtIn) => {
    expect(armSchema.parse(JSON.parse(JSON.stringify(builtIn)))).toEqual(builtIn);
  });

  it('with swapped limits is refused in degrees, joints counted from one', () => {
    expect(refusal(withJoint(2, { min: 95 * DEGREE, max: 75 * DEGREE }))).toEqual({
      path: 'joints.2.min',
      message: 'Joint 3 starts at 95° and ends at 75°. The start must be below the end.',
    });
    expect(refusal(withJoint(1, { type: 'prismatic', min: 0.5, max: 0.5 }))?.message).toBe(
      'Joint 2 starts at 500 mm and ends at 500 mm. The start must be below the end.',
    );
  });

  it.each(['a', 'alpha', 'd', 'theta', 'min', 'max', 'maxSpeed', 'maxAcceleration'])('needs a finite %s', (field) => {
    for (const bad of [NaN, Infinity, -Infinity, null, '1', undefined])
      expect(refusal(withJoint(3, { [field]: bad }))?.path).toBe(`joints.3.${field}`);
  });

  it.each(['maxSpeed', 'maxAcceleration'])('needs a %s above zero', (field) => {
    for (const bad of [0, -1])
      expect(refusal(withJoint(0, { [field]: bad }))).toEqual({
        path: `joints.0.${field}`,
        message: expect.stringMatching(/above zero\.$/) as string,
      });
  });

  it('has 1 to 12 joints', () => {
    expect(refusal({ ...arm, joints: [] })).toEqual({ path: 'joints', message: 'An arm needs at least one joint.' });
    expect(refusal({ ...arm, joints: repeated(13) })?.path).toBe('joints');
    expect(refusal({ ...arm, joints: repeated(12) })).toBeNull();
    expect(refusal({ ...arm, joints: repeated(1) })).toBeNull();
  });

  it('has a coupling with a row a joint and as many actuators as columns', () => {
    const square = arm.joints.map((_, i) => arm.joints.map((__, k) => (i === k ? 1 : 0)));
    expect(refusal({ ...arm, coupling: square })).toBeNull();
    expect(refusal({ ...arm, coupling: square.slice(1) })?.path).toBe('coupling');
    expect(refusal({ ...arm, coupling: [[1], ...square.slice(1)] })?.path).toMatch(/^coupling/);
    const narrow = square.map((row) => row.slice(1));
    expect(refusal({ ...arm, coupling: narrow })?.path).toBe('actuators');
    const actuators = arm.joints.slice(1).map(({ min, max, maxSpeed, maxAcceleration }) => ({
      min,
      max,
      maxSpeed,
      maxAcceleration,
    }));
    expect(refusal({ ...arm, coupling: narrow, actuators })).toBeNull();
    expect(refusal({ ...arm, coupling: square, actuators })?.path).toBe('actuators');
    expect(refusal({ ...arm, coupling: square.map(() => []) })?.path).toMatch(/^coupling/);
    expect(refusal({ ...arm, actuators })?.path).toBe('actuators');
    expect(refusal({ ...arm, coupling: narrow, actuators: [{ ...actuators[0], min: 2, max: 1 }] })?.path).toBe(
      'actuators.0.min',
    );
  });

  it('names freedoms once each, with one that moves the tool point', () => {
    expect(refusal({ ...arm, freedoms: ['x', 'y'] })).toBeNull();
    for (const freedoms of [[], ['x', 'x'], ['rx', 'rz'], ['w']])
      expect(refusal({ ...arm, freedoms })?.path).toMatch(/^freedoms/);
  });

  it.each([null, 7, 'arm', [], {}])('%j is no arm', (value) => {
    expect(refusal(value)).not.toBeNull();
  });
});
