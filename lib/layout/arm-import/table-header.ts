import type { Joint } from '@/lib/kinematics/types';
import type { JointField, Unit } from '../arm-columns';
import { refuse } from './imported-arm';

export interface TableColumn {
  readonly field: JointField | 'joint' | 'type';
  /** As written, for naming it in a refusal. */
  readonly label: string;
  /** By kind of joint; undefined where the header gives no unit that fits it. */
  readonly units: Partial<Record<Joint['type'], Unit>>;
}

const NAMES: Record<string, TableColumn['field']> = {
  joint: 'joint',
  no: 'joint',
  kind: 'type',
  type: 'type',
  a: 'a',
  alpha: 'alpha',
  α: 'alpha',
  d: 'd',
  theta: 'theta',
  θ: 'theta',
  from: 'min',
  lower: 'min',
  min: 'min',
  to: 'max',
  upper: 'max',
  max: 'max',
  speed: 'maxSpeed',
  velocity: 'maxSpeed',
  ramp: 'maxAcceleration',
  acceleration: 'maxAcceleration',
};
const LENGTHS: Record<string, Unit> = { mm: 'mm', m: 'm' };
const ANGLES: Record<string, Unit> = { deg: 'deg', '°': 'deg', rad: 'rad' };
const WANTED: Record<JointField, string> = {
  a: 'a (mm)',
  alpha: 'alpha (deg)',
  d: 'd (mm)',
  theta: 'theta (deg)',
  min: 'from (deg or mm)',
  max: 'to (deg or mm)',
  maxSpeed: 'speed (deg/s or mm/s)',
  maxAcceleration: 'ramp (deg/s2 or mm/s2)',
};
const FIELDS = Object.keys(WANTED) as JointField[];
/** What comes behind the unit of a speed and of an acceleration. */
const TIME: Partial<Record<JointField, RegExp>> = { maxSpeed: /\/s$/, maxAcceleration: /\/s(2|²|\^2)$/ };

/** Reads a header such as `a (mm)`, `from (deg or mm)`. Throws Refused, the column named. */
export function readHeader(cells: readonly string[], line: number): TableColumn[] {
  const columns = cells.map((cell) => readColumn(cell.trim(), line));
  for (const field of [...FIELDS, 'type'] as const) {
    const found = columns.filter((column) => column.field === field);
    const wanted = field === 'type' ? 'kind' : WANTED[field];
    if (found.length === 0) refuse(`There is no column “${wanted}”.`, `Line ${line}`);
    if (found.length > 1) refuse(`The column “${found[1].label}” stands there twice.`, `Line ${line}`);
  }
  return columns;
}

function readColumn(label: string, line: number): TableColumn {
  const where = `Line ${line}, column ${label || '(empty)'}`;
  const [, word = '', , unit = ''] = /^(.*?)\s*([([]\s*(.*?)\s*[)\]])?$/.exec(label) ?? [];
  const field =
    NAMES[word.toLowerCase()] ??
    refuse(`No column has this name. Known are joint, kind, ${FIELDS.map((each) => WANTED[each]).join(', ')}.`, where);
  if (field === 'joint' || field === 'type') return { field, label: word, units: {} };
  if (!unit) refuse(`The unit is missing: write “${WANTED[field]}”.`, where);
  return { field, label: word, units: readUnits(field, unit.toLowerCase(), where) };
}

function readUnits(field: JointField, unit: string, where: string): TableColumn['units'] {
  const unknown = (): never => refuse(`The unit “${unit}” is not known here: write “${WANTED[field]}”.`, where);
  let angle: Unit | undefined;
  let length: Unit | undefined;
  for (const part of unit.split(/\s+or\s+|\s*\|\s*/)) {
    const time = TIME[field];
    if (time && !time.test(part)) unknown();
    const plain = time ? part.replace(time, '').trim() : part;
    if (plain in ANGLES && angle === undefined) angle = ANGLES[plain];
    else if (plain in LENGTHS && length === undefined) length = LENGTHS[plain];
    else unknown();
  }
  if (field === 'a' || field === 'd') return angle !== undefined ? unknown() : { revolute: length, prismatic: length };
  if (field === 'alpha' || field === 'theta')
    return length !== undefined ? unknown() : { revolute: angle, prismatic: angle };
  return { revolute: angle, prismatic: length };
}
