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

  it.each([
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
