import type { ArmDefinition } from '@/lib/contracts/arm';

export type JointData = ArmDefinition['joints'][number];
export type JointField = Exclude<keyof JointData, 'type'>;

export interface JointColumn {
  field: JointField;
  label: string;
  /** Read aloud in place of a bare letter. */
  name: string;
  /** Lengths are given in mm, angles in degrees; what a joint's own travel is depends on its kind. */
  quantity: 'length' | 'angle' | 'travel';
}

/** The columns of a table of joints, in the order a drawing office writes them. */
export const JOINT_COLUMNS: readonly JointColumn[] = [
  { field: 'a', label: 'a', name: 'Link length a', quantity: 'length' },
  { field: 'alpha', label: 'α', name: 'Twist alpha', quantity: 'angle' },
  { field: 'd', label: 'd', name: 'Offset d', quantity: 'length' },
  { field: 'theta', label: 'θ', name: 'Angle theta', quantity: 'angle' },
  { field: 'min', label: 'from', name: 'Lower limit', quantity: 'travel' },
  { field: 'max', label: 'to', name: 'Upper limit', quantity: 'travel' },
  { field: 'maxSpeed', label: 'speed', name: 'Speed limit', quantity: 'travel' },
  { field: 'maxAcceleration', label: 'ramp', name: 'Acceleration limit', quantity: 'travel' },
];

const DEG_PER_RAD = 180 / Math.PI;
const MM_PER_M = 1000;

/** Factor from the stored number (m, rad) to the one shown (mm, degrees). */
export function shownPerStored({ quantity }: JointColumn, type: JointData['type']): number {
  if (quantity === 'length') return MM_PER_M;
  if (quantity === 'angle') return DEG_PER_RAD;
  return type === 'revolute' ? DEG_PER_RAD : MM_PER_M;
}
