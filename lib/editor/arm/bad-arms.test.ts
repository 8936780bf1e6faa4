import { describe, expect, it } from 'vitest';
import { analyseRequestSchema } from '@/lib/contracts/analyse';
import { newArmSchema } from '@/lib/contracts/arms';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import type { Arm, Joint } from '@/lib/kinematics/types';
import { readArmTable, writeArmTable } from '@/lib/layout/arm-import/table';
import { checkDraft } from './check';
import { draftOf } from './draft';

const { arm: good } = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-12kg')!;
const content = (definition: Arm) => ({ name: 'Bad', description: '', payloadKg: 12, definition });

const withJoint = (index: number, patch: Partial<Joint>): Arm => ({
  ...good,
  joints: good.joints.map((joint, i) => (i === index ? { ...joint, ...patch } : joint)),
});

interface Told {
  readonly path: string;
  readonly message: string;
}

const issuesOf = (checked: {
  success: boolean;
  error?: { issues: { path: PropertyKey[]; message: string }[] };
}): Told[] => checked.error?.issues.map(({ path, message }) => ({ path: path.join('.'), message })) ?? [];

/** What each entrance says of an arm; nothing where it lets it in. Over the wire JSON has no NaN: it arrives as null. */
const ENTRANCES: Record<string, (arm: Arm) => Told[]> = {
  form: (arm) => told(arm),
  import: (arm) => {
    const read = readArmTable(writeArmTable(content(arm)));
    if (read.ok) return told(read.value.arm);
    return read.refusals.map(({ where, message }) => ({ path: where ?? '', message }));
  },
  API: (arm) => issuesOf(newArmSchema.safeParse(JSON.parse(JSON.stringify(content(arm))))),
  analyse: (arm) => issuesOf(analyseRequestSchema.safeParse(JSON.parse(JSON.stringify({ arm })))),
};

function told(arm: Arm): Told[] {
  const { problems, content: taken } = checkDraft(draftOf(content(arm) as Parameters<typeof draftOf>[0]));
  expect(taken === null).toBe(problems.length > 0);
  return problems.flatMap(({ paths, message }) => (paths.length > 0 ? paths : ['']).map((path) => ({ path, message })));
}

/** An arm, and words or a path of which every entrance has to give one: the field that is wrong. */
const BAD: readonly (readonly [string, Arm, RegExp])[] = [
  ['a length that is no number', withJoint(1, { a: NaN }), /joints\.1\.a\b|line \d+.*\ba\b|joint 2/i],
  ['a length without end', withJoint(1, { d: Infinity }), /joints\.1\.d\b|line \d+.*\bd\b|joint 2/i],
  ['swapped limits', withJoint(2, { min: 2, max: -2 }), /joints\.2\.min|joint 3 minimum/i],
  ['a speed of zero', withJoint(4, { maxSpeed: 0 }), /joints\.4\.maxSpeed|line \d+.*speed|joint 5/i],
  ['no joint', { ...good, joints: [] }, /joint/i],
  ['twenty joints', { ...good, joints: Array.from({ length: 20 }, (_, i) => good.joints[i % 6]) }, /joint/i],
  ['a tool without end', { ...good, tool: { xyz: [0, NaN, 0.1], rpy: [0, 0, 0] } }, /tool/i],
];

describe('a bad arm is refused with the field named', () => {
  it.each(Object.keys(ENTRANCES))('and a good one is taken by the %s', (entrance) => {
    expect(ENTRANCES[entrance](good)).toEqual([]);
  });

  it.each(BAD.flatMap(([name, arm, field]) => Object.keys(ENTRANCES).map((way) => [name, way, arm, field] as const)))(
    '%s, by the %s',
    (_, entrance, arm, field) => {
      const said = ENTRANCES[entrance](arm).map(({ path, message }) => `${path}: ${message}`);
      expect(said.length).toBeGreaterThan(0);
      expect(
        said.some((words) => field.test(words)),
        said.join(' | '),
      ).toBe(true);
    },
  );
});
