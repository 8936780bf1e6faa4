import { describe, expect, it } from 'vitest';
import { analyse } from '@/lib/kinematics/analyse';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import { analyseAnswerSchema, analyseRequestSchema } from './analyse';

const arm = BUILT_IN_ARMS.find(({ slug }) => slug === 'scara-5kg')!.arm;
const grid = { origin: [0.2, 0], step: 0.1, columns: 3, rows: 2 };
const point = { position: [0.4, 0.1, 0.3], direction: [0, 0, -1], roll: 0 };
const pose = [
  [1, 0, 0, 0.4],
  [0, -1, 0, 0.1],
  [0, 0, -1, 0.3],
  [0, 0, 0, 1],
];

function pathRefused(question: Record<string, unknown>): string | null {
  const checked = analyseRequestSchema.safeParse({ arm, ...question });
  return checked.success ? null : checked.error.issues[0].path.join('.');
}

describe('questions to analyse', () => {
  it('fill in what a map leaves unsaid', () => {
    const { map } = analyseRequestSchema.parse({ arm, map: { grid, toolHeight: 0.3 } });
    expect(map).toMatchObject({ direction: { kind: 'down' }, roll: 'free', wrist: 'held', branch: 'best' });
  });

  it.each([
    [{ postures: [[0, 0, 0, 0], [0]] }, 'postures.1'],
    [{ postures: [[0, 0, 0, NaN]] }, 'postures.0.3'],
    [{ targets: [point, { ...point, position: [1, 2] }] }, 'targets.1.position'],
    [{ targets: [{ ...point, position: [1, 2, null] }] }, 'targets.0.position.2'],
    [{ targets: [{ ...point, direction: [0, 0, 0] }] }, 'targets.0.direction'],
    [{ targets: [{ ...point, roll: 'any' }] }, 'targets.0.roll'],
    [{ targets: [{ position: [0, 0, 0], roll: 0 }] }, 'targets.0.direction'],
    [{ targets: [7] }, 'targets.0'],
    [{ targets: [{ pose: pose.slice(1) }] }, 'targets.0.pose'],
    [{ targets: [{ pose: [[1, 0, 0], ...pose.slice(1)] }] }, 'targets.0.pose.0'],
    [{ targets: [{ pose: [[2, 0, 0, 0.4], ...pose.slice(1)] }] }, 'targets.0.pose'],
    [{ targets: [{ pose: [...pose.slice(0, 3), [0, 0, 1, 1]] }] }, 'targets.0.pose'],
    [{ map: { grid: { ...grid, step: 0 }, toolHeight: 0 } }, 'map.grid.step'],
    [{ map: { grid: { ...grid, rows: 0 }, toolHeight: 0 } }, 'map.grid.rows'],
    [{ map: { grid: { ...grid, rows: 1000, columns: 1001 }, toolHeight: 0 } }, 'map.grid'],
    [{ map: { grid } }, 'map.toolHeight'],
    [{ map: { grid, toolHeight: 0, wrist: 'loose' } }, 'map.wrist'],
    [{ arm: { ...arm, joints: [] } }, 'arm.joints'],
  ])('name the field that is wrong: %#', (question, path) => {
    expect(pathRefused(question)).toBe(path);
  });

  it('take a left-handed frame for no pose', () => {
    expect(pathRefused({ targets: [{ pose }] })).toBeNull();
    expect(pathRefused({ targets: [{ pose: [pose[0], [0, 1, 0, 0.1], pose[2], pose[3]] }] })).toBe('targets.0.pose');
  });
});

describe('answers of analyse', () => {
  it('keep to the contract', () => {
    const question = analyseRequestSchema.parse({
      arm,
      postures: [[0.1, 0.2, 0.05, 0.4]],
      targets: [point, { pose }, { ...point, position: [3, 0, 0.3] }],
      map: { grid, toolHeight: 0.3, roll: 0 },
    });
    const answers = analyse(question);
    expect(analyseAnswerSchema.parse(answers)).toEqual(answers);
    const { postures, targets, map } = answers;
    expect(postures![0].jacobian.map((row) => row.length)).toEqual([4, 4, 4, 4, 4, 4]);
    expect(targets!.map(({ reached }) => reached)).toEqual([true, true, false]);
    expect(targets![0].solutions).toEqual(targets![1].solutions);
    expect(targets![2].reason).toMatch(/^too far by \d+ mm$/);
    expect(map!.reason).toHaveLength(6);
    map!.reason.forEach((reason, cell) => {
      expect(map!.inverseConditionNumber[cell] === null).toBe(reason !== 'reached');
      expect(map!.branch[cell] === null).toBe(reason !== 'reached');
    });
  });

  it('leave out what was not asked for', () => {
    expect(analyse({ arm })).toEqual({});
    expect(Object.keys(analyse({ arm, targets: [] }))).toEqual(['targets']);
  });
});
