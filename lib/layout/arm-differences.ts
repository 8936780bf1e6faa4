import type { Arm, Frame, Joint } from '@/lib/kinematics/types';
import {
  actuatorType,
  JOINT_COLUMNS,
  KIND_WORDS,
  shownText,
  shownUnit,
  TRAVEL_COLUMNS,
  type JointColumn,
} from './arm-columns';

export interface ComparedArm {
  readonly name: string;
  readonly description: string;
  readonly payloadKg: number | null;
  readonly definition: Arm;
}

/** Behind a number: a speed is told a second, a ramp a second squared. */
function withUnit(text: string, { field, quantity }: JointColumn<string>, type: Joint['type']): string {
  const turns = shownUnit(quantity, type) === 'deg';
  const time = field === 'maxSpeed' ? '/s' : field === 'maxAcceleration' ? '/s²' : '';
  if (turns) return time ? `${text} °${time}` : `${text}°`;
  return `${text} mm${time}`;
}

/** What changed from one version of an arm to another, as short sentences; empty where nothing did. */
export function armDifferences(older: ComparedArm, newer: ComparedArm): string[] {
  const [left, right] = [older.definition, newer.definition];
  const payload = (kg: number | null): string => (kg === null ? 'none' : `${kg} kg`);
  return [
    ...told('Name', older.name, newer.name),
    ...(older.description === newer.description ? [] : ['The description reads differently.']),
    ...told('Payload', payload(older.payloadKg), payload(newer.payloadKg)),
    ...told('Convention', left.convention, right.convention),
    ...left.joints.flatMap((joint, index) => jointDifference(index, joint, right.joints[index])),
    ...right.joints.slice(left.joints.length).map((_, at) => `Joint ${left.joints.length + at + 1} is new.`),
    ...frameDifference('Base', left.base, right.base),
    ...frameDifference('Tool', left.tool, right.tool),
    ...told(
      'Controls',
      (left.freedoms ?? ['as the chain has it']).join(' '),
      (right.freedoms ?? ['as the chain has it']).join(' '),
    ),
    ...(JSON.stringify(left.coupling) === JSON.stringify(right.coupling) ? [] : [couplingWords(left, right)]),
    ...actuatorDifferences(left, right),
  ];
}

const told = (what: string, before: string, after: string): string[] =>
  before === after ? [] : [`${what}: ${before} → ${after}.`];

function jointDifference(index: number, before: Joint, after: Joint | undefined): string[] {
  const label = `Joint ${index + 1}`;
  if (!after) return [`${label} is gone.`];
  if (before.type !== after.type)
    return [`${label} ${KIND_WORDS[after.type]} now, before it ${KIND_WORDS[before.type]}.`];
  return rowDifference(label, JOINT_COLUMNS, before, after, before.type);
}

function rowDifference<Field extends string>(
  label: string,
  columns: readonly JointColumn<Field>[],
  before: Readonly<Record<Field, number>>,
  after: Readonly<Record<Field, number>>,
  type: Joint['type'],
): string[] {
  const parts = columns.flatMap((column) => {
    const [one, other] = [before[column.field], after[column.field]];
    if (one === other) return [];
    const [from, to] = [one, other].map((value) => shownText(value, column.quantity, type));
    // Less than the table shows: said, but without two equal numbers.
    if (from === to) return [`${column.label} by less than a thousandth`];
    return [`${column.label} ${withUnit(from, column, type)} → ${withUnit(to, column, type)}`];
  });
  return parts.length > 0 ? [`${label}: ${parts.join(', ')}.`] : [];
}

function frameDifference(what: string, before: Frame | undefined, after: Frame | undefined): string[] {
  const words = (frame: Frame | undefined): string => {
    if (!frame) return 'none';
    const xyz = frame.xyz.map((m) => shownText(m, 'length', 'revolute')).join(' ');
    const rpy = frame.rpy.map((rad) => `${shownText(rad, 'angle', 'revolute')}°`).join(' ');
    return `${xyz} mm, ${rpy}`;
  };
  return told(what, words(before), words(after));
}

function couplingWords(before: Arm, after: Arm): string {
  if (!before.coupling) return 'The joints are coupled now.';
  return after.coupling ? 'The coupling is another one.' : 'The joints are no longer coupled.';
}

function actuatorDifferences(before: Arm, after: Arm): string[] {
  const [one, other] = [before.actuators ?? [], after.actuators ?? []];
  if (one.length !== other.length) return [`Actuators: ${one.length || 'none'} → ${other.length || 'none'}.`];
  return one.flatMap((actuator, index) => {
    const type = actuatorType(after.joints, after.coupling ?? [], index);
    return rowDifference(`Actuator ${index + 1}`, TRAVEL_COLUMNS, actuator, other[index], type);
  });
}
