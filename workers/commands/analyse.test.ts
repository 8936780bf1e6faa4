import { spawnSync } from 'node:child_process';
import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';

const [{ arm }] = BUILT_IN_ARMS;
const root = new URL('../..', import.meta.url).pathname;

function run(input: string) {
  const { status, stdout, stderr } = spawnSync(process.execPath, ['--import', 'tsx', 'workers/commands/analyse.ts'], {
    cwd: root,
    input,
    encoding: 'utf8',
  });
  return { status, stdout, stderr };
}

describe('the analyse command', () => {
  it('prints one JSON answer and nothing else', () => {
    const { status, stdout, stderr } = run(JSON.stringify({ arm, postures: [[0, -1, 0.3, 0, 0.5, 0]], targets: [] }));
    expect({ status, stderr }).toEqual({ status: 0, stderr: '' });
    const answer = JSON.parse(stdout) as { postures: { wristHeld: { sureSpeed: number } }[]; targets: unknown[] };
    expect(answer.postures[0].wristHeld.sureSpeed).toBeGreaterThan(0);
    expect(answer.targets).toEqual([]);
  });

  it('times a sequence: 90° at 180 °/s and 600 °/s² there and back, and a wait', () => {
    const degree = Math.PI / 180;
    const joint = { type: 'revolute', a: 0.5, alpha: 0, d: 0, theta: 0, min: -2, max: 2 };
    const turning = { ...joint, maxSpeed: 180 * degree, maxAcceleration: 600 * degree };
    const target = (angle: number) => ({
      target: { position: [0.5 * Math.cos(angle), 0.5 * Math.sin(angle), 0], direction: [0, 0, 1], roll: 'free' },
    });
    const question = {
      arm: { convention: 'standard', freedoms: ['x', 'y'], joints: [turning] },
      sequence: {
        steps: [
          target(0),
          target(90 * degree),
          { wait: 0.5 },
          { target: { ...target(0).target, position: [9, 0, 0] } },
        ],
      },
    };
    const { status, stdout } = run(JSON.stringify(question));
    expect(status).toBe(0);
    const { sequence } = JSON.parse(stdout) as {
      sequence: { time: number; steps: { reached: boolean; reason: string | null }[] };
    };
    // 0.8 s a way (KINEMATICS.md: trapezoid check value).
    expect(sequence.time).toBeCloseTo(0.8 + 0.8 + 0.5, 6);
    expect(sequence.steps.map(({ reached }) => reached)).toEqual([true, true, true, false]);
    expect(sequence.steps[3].reason).toMatch(/^Out of reach by 8500 mm\. The step is left out\.$/);
  });

  it.each([
    ['a wait below zero', JSON.stringify({ arm, sequence: { steps: [{ wait: -1 }] } }), 'sequence.steps[0].wait'],
    ['nothing', '', ''],
    ['blanks', ' \n', ''],
    ['no JSON', '{"arm": NaN}', ''],
    ['another value', '[]', ''],
    ['no arm', '{}', 'arm'],
    ['a bad number', JSON.stringify({ arm, postures: [[0, 0, 0, 0, 0, '1']] }), 'postures[0][5]'],
    [
      'a speed of zero',
      JSON.stringify({ arm: { ...arm, joints: [{ ...arm.joints[0], maxSpeed: 0 }, ...arm.joints.slice(1)] } }),
      'arm.joints[0].maxSpeed',
    ],
    [
      'a branch that the arm does not have',
      JSON.stringify({
        arm,
        map: { grid: { origin: [0, 0], step: 1, columns: 1, rows: 1 }, toolHeight: 0, branch: 'sideways' },
      }),
      'map.branch',
    ],
  ])('on %s exits with 2 and one JSON error that names the path', (_, input, path) => {
    const { status, stdout, stderr } = run(input);
    expect({ status, stdout }).toEqual({ status: 2, stdout: '' });
    expect(stderr.trimEnd().split('\n')).toHaveLength(1);
    const { error } = JSON.parse(stderr) as { error: { path: string; message: string } };
    expect(error.path).toBe(path);
    expect(error.message.length).toBeGreaterThan(10);
  });
});
