import type { Actuator, Arm, Frame, Freedom, Joint } from '@/lib/kinematics/types';
import { FREEDOMS } from '@/lib/kinematics/freedoms';
import { actuatorType, shownUnit, storedFrom, TRAVEL_COLUMNS } from '../arm-columns';
import { refuse } from './imported-arm';
import { readNumber, shortestText } from './table-numbers';

/** Lines such as `# tool (mm, deg): 0 0 100 0 0 0` that say of an arm what no column can. */
export interface TableFacts {
  name: string;
  description: string[];
  payloadKg: number | null;
  convention: Arm['convention'] | null;
  base?: Frame;
  tool?: Frame;
  freedoms?: Freedom[];
  coupling: number[][];
  /** As written, mm or degrees: which one follows from the joints. */
  actuators: [number, number, number, number][];
}

export const noFacts = (): TableFacts => ({
  name: '',
  description: [],
  payloadKg: null,
  convention: null,
  coupling: [],
  actuators: [],
});

const LONGEST_LINE = 4000;

/** Takes in one line that begins with #. Others than the known ones are remarks of the writer. Throws Refused. */
export function readFact(line: string, number: number, facts: TableFacts): void {
  const [, key = '', value = ''] = /^#\s*([a-z]+[^:]*?)\s*:\s*(.*?)\s*$/i.exec(line.slice(0, LONGEST_LINE)) ?? [];
  const where = `Line ${number}`;
  const word = key.toLowerCase().split(/[\s(]/)[0];
  if (word === 'name') facts.name = value;
  else if (word === 'description') facts.description.push(value);
  else if (word === 'payload') facts.payloadKg = numbersOf(value, 1, 'the payload in kg', where)[0];
  else if (word === 'convention') facts.convention = conventionOf(value, where);
  else if (word === 'base' || word === 'tool')
    facts[word] = frameOfNumbers(numbersOf(value, 6, 'x y z in mm and roll pitch yaw in degrees', `${where}, ${word}`));
  else if (word === 'controls') facts.freedoms = value.split(/\s+/).map((each) => freedomOf(each, where));
  else if (word === 'coupling') facts.coupling.push(numbersOf(value, null, 'one figure an actuator', where));
  else if (word === 'actuator')
    facts.actuators.push(numbersOf(value, 4, 'from, to, speed and ramp', where) as [number, number, number, number]);
}

function conventionOf(value: string, where: string): Arm['convention'] {
  if (value === 'standard' || value === 'modified') return value;
  return refuse(`The convention is “standard” or “modified”, not “${value}”.`, where);
}

function freedomOf(value: string, where: string): Freedom {
  const found = FREEDOMS.find((freedom) => freedom === value);
  return found ?? refuse(`“${value}” is none of ${FREEDOMS.join(', ')}.`, where);
}

function numbersOf(value: string, count: number | null, what: string, where: string): number[] {
  const numbers = value.split(/\s+/).map((text) => readNumber(text, '.'));
  if ((count !== null && numbers.length !== count) || numbers.some((each) => each === null || Number.isNaN(each)))
    refuse(`Write ${what} as plain numbers with blanks between them.`, where);
  return numbers as number[];
}

function frameOfNumbers([x, y, z, roll, pitch, yaw]: number[]): Frame {
  const [rx, ry, rz] = [roll, pitch, yaw].map((angle) => storedFrom(angle, 'deg'));
  return { xyz: [storedFrom(x, 'mm'), storedFrom(y, 'mm'), storedFrom(z, 'mm')], rpy: [rx, ry, rz] };
}

/** The arm that rows and facts make together. */
export function armOfFacts(joints: Joint[], facts: TableFacts): Arm {
  const { base, tool, freedoms, coupling, convention } = facts;
  const actuators = facts.actuators.map(([min, max, maxSpeed, maxAcceleration], index): Actuator => {
    const unit = shownUnit('travel', actuatorType(joints, coupling, index));
    return {
      min: storedFrom(min, unit),
      max: storedFrom(max, unit),
      maxSpeed: storedFrom(maxSpeed, unit),
      maxAcceleration: storedFrom(maxAcceleration, unit),
    };
  });
  return {
    convention: convention ?? 'standard',
    joints,
    ...(base && { base }),
    ...(tool && { tool }),
    ...(freedoms && { freedoms }),
    ...(coupling.length > 0 && { coupling }),
    ...(actuators.length > 0 && { actuators }),
  };
}

/** The lines that `readFact` reads back as the same. */
export function writeFacts(name: string, description: string, payloadKg: number | null, arm: Arm): string[] {
  const frame = ({ xyz, rpy }: Frame): string =>
    [...xyz.map((m) => shortestText(m, 'mm')), ...rpy.map((rad) => shortestText(rad, 'deg'))].join(' ');
  return [
    `# name: ${name}`,
    ...(description ? description.split(/\r?\n/).map((line) => `# description: ${line}`) : []),
    ...(payloadKg === null ? [] : [`# payload (kg): ${payloadKg}`]),
    `# convention: ${arm.convention}`,
    ...(arm.base ? [`# base (mm, deg): ${frame(arm.base)}`] : []),
    ...(arm.tool ? [`# tool (mm, deg): ${frame(arm.tool)}`] : []),
    ...(arm.freedoms ? [`# controls: ${arm.freedoms.join(' ')}`] : []),
    ...(arm.coupling ?? []).map((row, index) => `# coupling ${index + 1}: ${row.join(' ')}`),
    ...(arm.actuators ?? []).map((actuator, index) => {
      const unit = shownUnit('travel', actuatorType(arm.joints, arm.coupling ?? [], index));
      const figures = TRAVEL_COLUMNS.map(({ field }) => shortestText(actuator[field], unit));
      return `# actuator ${index + 1} (deg or mm): ${figures.join(' ')}`;
    }),
  ];
}
