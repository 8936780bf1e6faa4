import type { ArmContent } from '@/lib/contracts/arms';
import type { Frame, Joint } from '@/lib/kinematics/types';
import {
  actuatorType,
  JOINT_COLUMNS,
  shownText,
  shownUnit,
  storedFrom,
  TRAVEL_COLUMNS,
  type JointColumn,
  type JointField,
  type TravelField,
} from '@/lib/layout/arm-columns';
import { readNumber } from '@/lib/layout/arm-import/table-numbers';

/**
 * An arm while it is being edited: every number as its text, in mm and degrees, beside the stored number that it stands for (m, rad).
 * A number that nobody touches keeps all of its digits, though fewer are shown.
 */
export interface DraftCell {
  readonly text: string;
  /** NaN while the text is empty or no number. */
  readonly value: number;
}

export interface DraftJoint {
  /** Stays with the row when it is moved. */
  readonly key: number;
  readonly type: Joint['type'];
  readonly cells: Readonly<Record<JointField, DraftCell>>;
}

export type DraftFrame = readonly DraftCell[];
export type DraftActuator = Readonly<Record<TravelField, DraftCell>>;

export interface ArmDraft {
  readonly name: string;
  readonly description: string;
  readonly payloadKg: DraftCell;
  readonly convention: 'standard' | 'modified';
  readonly joints: readonly DraftJoint[];
  /** x y z (mm), roll pitch yaw (degrees); null where there is none. */
  readonly base: DraftFrame | null;
  readonly tool: DraftFrame | null;
  readonly freedoms: ArmContent['definition']['freedoms'];
  readonly coupling: readonly (readonly DraftCell[])[] | null;
  readonly actuators: readonly DraftActuator[] | null;
}

export type FrameName = 'base' | 'tool';

/** An arm as it is stored, or as a file gives it (NaN for what the file leaves out). */
export interface DraftSource extends Omit<ArmContent, 'definition'> {
  definition: Pick<
    ArmContent['definition'],
    'convention' | 'joints' | 'base' | 'tool' | 'freedoms' | 'coupling' | 'actuators'
  >;
}

type Quantity = JointColumn['quantity'];

export const cellOf = (value: number, quantity: Quantity, type: Joint['type']): DraftCell => ({
  text: shownText(value, quantity, type),
  value,
});

/** What somebody types: a comma or a point for the decimals. */
export function typedCell(text: string, quantity: Quantity, type: Joint['type']): DraftCell {
  const number = typedNumber(text);
  return { text, value: number === null ? NaN : storedFrom(number, shownUnit(quantity, type)) };
}

/** Null for a text that is no number; NaN for none at all. */
export function typedNumber(text: string): number | null {
  return readNumber(text, text.includes('.') ? '.' : ',');
}

/** Figures without a unit of ours: kg, shares. */
export const plainCell = (value: number | null): DraftCell => ({
  text: value === null || !Number.isFinite(value) ? '' : String(Number(value.toFixed(6))).replace('-', '\u2212'),
  value: value ?? NaN,
});
export const typedPlainCell = (text: string): DraftCell => ({ text, value: typedNumber(text) ?? NaN });

let nextKey = 1;
export const newKey = (): number => nextKey++;

export const FRAME_QUANTITIES: readonly Quantity[] = ['length', 'length', 'length', 'angle', 'angle', 'angle'];

const frameOf = (frame: Frame | undefined): DraftFrame | null =>
  frame ? [...frame.xyz, ...frame.rpy].map((value, index) => cellOf(value, FRAME_QUANTITIES[index], 'revolute')) : null;

const cellsOf = <Field extends JointField>(
  columns: readonly JointColumn<Field>[],
  row: Readonly<Record<Field, number>>,
  type: Joint['type'],
): Record<Field, DraftCell> =>
  Object.fromEntries(columns.map(({ field, quantity }) => [field, cellOf(row[field], quantity, type)])) as Record<
    Field,
    DraftCell
  >;

export function draftOf({ name, description, payloadKg, definition }: DraftSource): ArmDraft {
  const { convention, joints, base, tool, freedoms, coupling, actuators } = definition;
  return {
    name,
    description,
    payloadKg: plainCell(payloadKg),
    convention,
    joints: joints.map((joint) => ({
      key: newKey(),
      type: joint.type,
      cells: cellsOf(JOINT_COLUMNS, joint, joint.type),
    })),
    base: frameOf(base),
    tool: frameOf(tool),
    freedoms,
    coupling: coupling?.map((row) => row.map(plainCell)) ?? null,
    actuators:
      actuators?.map((actuator, index) =>
        cellsOf(TRAVEL_COLUMNS, actuator, actuatorType(joints, coupling ?? [], index)),
      ) ?? null,
  };
}

/** A table of two joints to begin with: their limits, speeds and ramps are for the writer to say. */
export function emptyDraft(): ArmDraft {
  const blank = { min: NaN, max: NaN, maxSpeed: NaN, maxAcceleration: NaN };
  const joint = { type: 'revolute' as const, a: 0, alpha: 0, d: 0, theta: 0, ...blank };
  return draftOf({
    name: '',
    description: '',
    payloadKg: null,
    definition: { convention: 'standard', joints: [joint, joint] },
  });
}

/** Everything that is written in a draft, for telling two apart. */
export function draftText({ joints, ...rest }: ArmDraft): string {
  return JSON.stringify([rest, joints.map(({ type, cells }) => [type, cells])]);
}
