import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import type { Arm, Joint } from '@/lib/kinematics/types';
import { IMPORT_MAX_BYTES, type ImportedArm } from './imported-arm';
import { readArmTable, writeArmTable } from './table';

const DEGREE = Math.PI / 180;
const HEADER =
  'kind,a (mm),alpha (deg),d (mm),theta (deg),from (deg or mm),to (deg or mm),speed (deg/s or mm/s),ramp (deg/s2 or mm/s2)';
const ROW = 'turns,150,-90,450,0,-170,170,166,620';

function taken(text: string): ImportedArm {
  const answer = readArmTable(text);
  if (!answer.ok) throw new Error(answer.refusals.map(({ where, message }) => `${where}: ${message}`).join('\n'));
  return answer.value;
}

function refused(text: string): string[] {
  const answer = readArmTable(text);
  return answer.ok ? [] : answer.refusals.map(({ where, message }) => `${where ?? ''}: ${message}`);
}

describe('readArmTable', () => {
  it('reads mm and degrees', () => {
    const { arm, sources } = taken(`${HEADER}\n${ROW}\n`);
    expect(arm).toEqual({
      convention: 'standard',
      joints: [
        {
          type: 'revolute',
          a: 0.15,
          alpha: -Math.PI / 2,
          d: 0.45,
          theta: 0,
          min: -170 * DEGREE,
          max: 170 * DEGREE,
          maxSpeed: 166 * DEGREE,
          maxAcceleration: 620 * DEGREE,
        },
      ],
    });
    expect(sources).toEqual(['line 2']);
  });

  it.each([
    ['semicolons and decimal commas', ';', '150,5'],
    ['tabs and decimal commas', '\t', '150,5'],
    ['commas and quoted decimal commas', ',', '"150,5"'],
    ['commas and points', ',', '150.5'],
    ['semicolons and points', ';', '150.5'],
  ])('takes %s', (_case, separator, a) => {
    const text = [HEADER, ROW.replace('150', 'A')]
      .map((line) => line.split(',').join(separator))
      .join('\r\n')
      .replace('A', a);
    expect(taken(`\ufeff${text}`).arm.joints[0].a).toBe(0.1505);
  });

  it('takes metres, radians, a sliding joint, columns in any order and a typed minus', () => {
    const text = `a [m];Kind;d (m);alpha (rad);theta (rad);to (rad or m);from (rad or m);ramp (rad/s^2 or m/s^2);speed (rad/s or m/s)
0.5;slides;0;\u22121.5;0;0.25;0;9;1.1`;
    expect(taken(text).arm.joints[0]).toEqual({
      type: 'prismatic',
      a: 0.5,
      alpha: -1.5,
      d: 0,
      theta: 0,
      min: 0,
      max: 0.25,
      maxSpeed: 1.1,
      maxAcceleration: 9,
    });
  });

  it('leaves open what the table leaves empty, and says which convention it took', () => {
    const { arm, notes } = taken(`${HEADER}\n${ROW.replace(',620', ',')}`);
    expect(arm.joints[0].maxAcceleration).toBeNaN();
    expect(notes).toEqual([expect.stringMatching(/standard DH/)]);
    expect(taken(`# Convention: modified\n${HEADER}\n${ROW}`)).toMatchObject({
      notes: [],
      arm: { convention: 'modified' },
    });
  });

  it.each([
    ['an empty file', '', /: The file holds no table/],
    ['a header alone', HEADER, /no joint under the header/],
    ['text', 'Dear colleague\nhere is the arm', /^Line 1: The first line is no header/],
    [
      'a missing unit',
      `${HEADER.replace('a (mm)', 'a')}\n${ROW}`,
      /^Line 1, column a: The unit is missing: write “a \(mm\)”/,
    ],
    [
      'a wrong unit',
      `${HEADER.replace('a (mm)', 'a (deg)')}\n${ROW}`,
      /^Line 1, column a \(deg\): The unit “deg” is not known here/,
    ],
    [
      'a missing column',
      `${HEADER.replace('theta', 'omega')}\n${ROW}`,
      /^Line 1, column omega \(deg\): No column has this name/,
    ],
    ['a column twice', `${HEADER},a (m)\n${ROW},1`, /^Line 1: The column “a” stands there twice/],
    [
      'a column left out',
      `${HEADER.replace(',theta (deg)', '')}\n${ROW.replace(',450,0', ',450')}`,
      /^Line 1: There is no column “theta \(deg\)”/,
    ],
    ['a word for a number', `${HEADER}\n${ROW.replace('450', 'tall')}`, /^Line 2, column d: “tall” is no number/],
    ['NaN', `${HEADER}\n${ROW.replace('450', 'NaN')}`, /^Line 2, column d: “NaN” is no number/],
    ['an endless number', `${HEADER}\n${ROW.replace('450', '1e999')}`, /^Line 2, column d: “1e999” is no number/],
    [
      'an unknown kind',
      `${HEADER}\n${ROW.replace('turns', 'wobbles')}`,
      /^Line 2, column kind: “wobbles” is no kind of joint/,
    ],
    [
      'a sliding joint in degrees',
      `${HEADER.replace('from (deg or mm)', 'from (deg)')}\n${ROW.replace('turns', 'slides')}`,
      /^Line 2, column from: Joint 1 slides, and the header gives no unit/,
    ],
    [
      'an unquoted decimal comma',
      `${HEADER}\n${ROW.replace('450', '450,5')}`,
      /^Line 2: There are 10 cells, the header has 9/,
    ],
    [
      'thousands or decimals',
      `${HEADER}\n${ROW.replace('450', '"1,450"')}`,
      /^Line 2, column d: “1,450” may mean thousands or decimals/,
    ],
    [
      'both marks',
      `${HEADER}\n${ROW.replace('450', '"450,5"')}\n${ROW.replace('450', '450.5')}`,
      /^Line 2, column d: “450,5” has a comma and “450.5” a point/,
    ],
    ['an open quotation mark', `${HEADER}\n${ROW.replace('450', '"450')}`, /^Line 2: A quotation mark is opened/],
    ['joints out of order', `joint,${HEADER}\n2,${ROW}`, /^Line 2, column joint: Joint 1 is due here/],
    ['a broken tool line', `# tool (mm, deg): 0 0 x 0 0 0\n${HEADER}\n${ROW}`, /^Line 1, tool: Write x y z in mm/],
    ['another convention', `# convention: mine\n${HEADER}\n${ROW}`, /^Line 1: The convention is/],
  ])('refuses %s with its place', (_case, text, words) => {
    expect(refused(text)).toContainEqual(expect.stringMatching(words));
  });

  it('names every cell that it cannot read, not the first alone', () => {
    expect(refused(`${HEADER}\n${ROW.replace('450', 'x')}\n${ROW.replace('150', 'y')}`)).toHaveLength(2);
  });

  it('refuses what is too large unread', () => {
    expect(refused('x'.repeat(IMPORT_MAX_BYTES + 1))).toEqual([expect.stringMatching(/larger than 1 MB/)]);
    expect(refused(`${HEADER}\n${`${ROW}\n`.repeat(600)}`)).toEqual([expect.stringMatching(/601 lines/)]);
  });

  it('answers any text without an exception', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 300 }), (text) => {
        readArmTable(text);
        readArmTable(`${HEADER}\n${text}`);
        readArmTable(`# ${text}\n${HEADER}\n${ROW}`);
      }),
      { seed: 3, numRuns: 400 },
    );
  });
});

const finite = (limit: number) => fc.double({ min: -limit, max: limit, noNaN: true }).map((value) => value + 0);
const anyJoint: fc.Arbitrary<Joint> = fc.record({
  type: fc.constantFrom('revolute' as const, 'prismatic' as const),
  a: finite(3),
  alpha: finite(4),
  d: finite(3),
  theta: finite(4),
  min: finite(6),
  max: finite(6),
  maxSpeed: fc.double({ min: 0.001, max: 20, noNaN: true }),
  maxAcceleration: fc.double({ min: 0.001, max: 90, noNaN: true }),
});

/** Units turn numbers over once each way: the last digit may move. */
function expectAlike(arm: Arm, other: Arm): void {
  const flat = (of: Arm): number[] =>
    of.joints.flatMap(({ type: _type, ...figures }) => Object.values(figures as Record<string, number>));
  flat(arm).forEach((value, index) => expect(Math.abs(value - flat(other)[index])).toBeLessThan(1e-12));
  expect(other.joints.map(({ type }) => type)).toEqual(arm.joints.map(({ type }) => type));
}

describe('writeArmTable', () => {
  it('is read back as the very same arm for the whole library', () => {
    for (const { name, description, payloadKg, arm } of BUILT_IN_ARMS) {
      const back = taken(writeArmTable({ name, description, payloadKg, definition: arm }));
      expect(back).toMatchObject({ name, description, payloadKg, notes: [] });
      expect(back.arm).toEqual(arm);
    }
  });

  it('keeps tool, base, freedoms, coupling and actuators', () => {
    const driven = { min: -1, max: 1, maxSpeed: 2, maxAcceleration: 3 };
    const joints = BUILT_IN_ARMS[0].arm.joints.slice(0, 2);
    const arm: Arm = {
      convention: 'modified',
      joints,
      base: { xyz: [0.1, 0, 0.5], rpy: [0, Math.PI / 2, 0] },
      tool: { xyz: [0, 0, 0.1234567], rpy: [0.25, 0, 0] },
      freedoms: ['x', 'z'],
      coupling: [
        [1, 0],
        [-1, 1],
      ],
      actuators: [driven, driven],
    };
    const { arm: back, description } = taken(
      writeArmTable({ name: 'A', description: 'One\nTwo', payloadKg: null, definition: arm }),
    );
    expect(description).toBe('One\nTwo');
    expect(back.freedoms).toEqual(arm.freedoms);
    expect(back.coupling).toEqual(arm.coupling);
    expect(back.actuators?.[1].maxAcceleration).toBeCloseTo(3, 12);
    expect(back.tool?.xyz[2]).toBe(0.1234567);
    expect(back.base?.rpy[1]).toBe(Math.PI / 2);
    expectAlike(arm, back);
  });

  it('is read back alike for any joints', () => {
    fc.assert(
      fc.property(fc.array(anyJoint, { minLength: 1, maxLength: 12 }), (joints) => {
        const arm: Arm = { convention: 'standard', joints };
        expectAlike(arm, taken(writeArmTable({ name: 'Any', description: '', payloadKg: 1, definition: arm })).arm);
      }),
      { seed: 5, numRuns: 200 },
    );
  });
});
