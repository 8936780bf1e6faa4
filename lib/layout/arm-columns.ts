import type { Joint } from '@/lib/kinematics/types';

export type JointField = Exclude<keyof Joint, 'type'>;
export type TravelField = 'min' | 'max' | 'maxSpeed' | 'maxAcceleration';

export interface JointColumn<Field extends string = JointField> {
  field: Field;
  label: string;
  /** Read aloud in place of a bare letter. */
  name: string;
  /** Lengths are given in mm, angles in degrees; what a joint's own travel is depends on its kind. */
  quantity: 'length' | 'angle' | 'travel';
}

/** What a joint or an actuator may do. */
export const TRAVEL_COLUMNS: readonly JointColumn<TravelField>[] = [
  { field: 'min', label: 'from', name: 'Lower limit', quantity: 'travel' },
  { field: 'max', label: 'to', name: 'Upper limit', quantity: 'travel' },
  { field: 'maxSpeed', label: 'speed', name: 'Speed limit', quantity: 'travel' },
  { field: 'maxAcceleration', label: 'ramp', name: 'Acceleration limit', quantity: 'travel' },
];

/** The columns of a table of joints, in the order a drawing office writes them. */
export const JOINT_COLUMNS: readonly JointColumn[] = [
  { field: 'a', label: 'a', name: 'Link length a', quantity: 'length' },
  { field: 'alpha', label: 'α', name: 'Twist alpha', quantity: 'angle' },
  { field: 'd', label: 'd', name: 'Offset d', quantity: 'length' },
  { field: 'theta', label: 'θ', name: 'Angle theta', quantity: 'angle' },
  ...TRAVEL_COLUMNS,
];

export const KIND_WORDS: Record<Joint['type'], string> = { revolute: 'turns', prismatic: 'slides' };

/** Units that numbers come in; mm and deg are the ones shown. */
export type Unit = 'mm' | 'm' | 'deg' | 'rad';

export function shownUnit(quantity: JointColumn['quantity'], type: Joint['type']): 'mm' | 'deg' {
  if (quantity === 'length') return 'mm';
  if (quantity === 'angle') return 'deg';
  return type === 'revolute' ? 'deg' : 'mm';
}

/** The stored number (m, rad). Worked so that −90° is −π/2 and 345 mm is 0.345 m to the last digit. */
export function storedFrom(value: number, unit: Unit): number {
  if (unit === 'deg') return value * (Math.PI / 180);
  return unit === 'mm' ? value / 1000 : value;
}

export function inUnit(stored: number, unit: Unit): number {
  if (unit === 'deg') return stored * (180 / Math.PI);
  return unit === 'mm' ? stored * 1000 : stored;
}

/** Most decimals that are shown: a thousandth of a mm or of a degree. */
const DECIMALS = 3;

/** Whole numbers where they are whole: 450, but 12.5. An empty text for what is missing (NaN). */
export function shownText(stored: number, quantity: JointColumn['quantity'], type: Joint['type']): string {
  if (!Number.isFinite(stored)) return '';
  const shown = Number(inUnit(stored, shownUnit(quantity, type)).toFixed(DECIMALS));
  return String(shown === 0 ? 0 : shown).replace('-', '\u2212');
}

/** What an actuator's travel is measured in: as the joint of its own number where it drives that, else as the first it drives. */
export function actuatorType(
  joints: readonly Pick<Joint, 'type'>[],
  coupling: readonly (readonly number[])[],
  actuator: number,
): Joint['type'] {
  const drives = (joint: number): boolean => Boolean(coupling[joint]?.[actuator]);
  const joint = drives(actuator) ? actuator : joints.findIndex((_, index) => drives(index));
  return joints[joint]?.type ?? 'revolute';
}
