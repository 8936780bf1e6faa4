import { JOINT_COLUMNS, TRAVEL_COLUMNS, actuatorType, type JointField } from '@/lib/layout/arm-columns';
import type { Joint } from '@/lib/kinematics/types';
import {
  cellOf,
  FRAME_QUANTITIES,
  newKey,
  plainCell,
  typedCell,
  typedPlainCell,
  type ArmDraft,
  type DraftActuator,
  type DraftCell,
  type DraftJoint,
  type FrameName,
} from './draft';

/** Each edit gives a new draft; none throws. Cells are named as the arm's schema names them: `joints.2.min`, `tool.xyz.0`. */

export const MOST_JOINTS = 12;

const replaced = <Entry>(list: readonly Entry[], index: number, entry: Entry): Entry[] =>
  list.map((each, at) => (at === index ? entry : each));

function withJoint(draft: ArmDraft, index: number, change: (joint: DraftJoint) => DraftJoint): ArmDraft {
  const joint = draft.joints[index];
  return joint ? { ...draft, joints: replaced(draft.joints, index, change(joint)) } : draft;
}

/** Writes a text into a cell; a path that leads nowhere changes nothing. */
export function setCell(draft: ArmDraft, path: string, text: string): ArmDraft {
  const [part, first, second] = path.split('.');
  const index = Number(first);
  if (part === 'name' || part === 'description') return { ...draft, [part]: text };
  if (part === 'payloadKg') return { ...draft, payloadKg: typedPlainCell(text) };
  if (part === 'joints') return setJointField(draft, index, second, text);
  if (part === 'base' || part === 'tool')
    return setFrameCell(draft, part, (first === 'rpy' ? 3 : 0) + Number(second), text);
  if (part === 'coupling' && draft.coupling?.[index]) {
    const row = replaced(draft.coupling[index], Number(second), typedPlainCell(text));
    return retypeActuators({ ...draft, coupling: replaced(draft.coupling, index, row) });
  }
  const column = TRAVEL_COLUMNS.find(({ field }) => field === second);
  if (part === 'actuators' && draft.actuators?.[index] && column) {
    const cell = typedCell(text, 'travel', typeOfActuator(draft, index));
    return {
      ...draft,
      actuators: replaced(draft.actuators, index, { ...draft.actuators[index], [column.field]: cell }),
    };
  }
  return draft;
}

function setJointField(draft: ArmDraft, index: number, field: string, text: string): ArmDraft {
  if (field === 'type') return setKind(draft, index, kindOf(text));
  const column = JOINT_COLUMNS.find((each) => each.field === field);
  if (!column) return draft;
  return withJoint(draft, index, (joint) => ({
    ...joint,
    cells: { ...joint.cells, [column.field]: typedCell(text, column.quantity, joint.type) },
  }));
}

const kindOf = (text: string): Joint['type'] => (/^\s*(s|p)/i.test(text) ? 'prismatic' : 'revolute');

/** Turning or sliding: what stands in the travel columns keeps its text, and is mm where it was degrees. */
export function setKind(draft: ArmDraft, index: number, type: Joint['type']): ArmDraft {
  if (draft.joints[index]?.type === type) return draft;
  const next = withJoint(draft, index, (joint) => {
    const travel = TRAVEL_COLUMNS.map(({ field }) => [field, typedCell(joint.cells[field].text, 'travel', type)]);
    return { ...joint, type, cells: { ...joint.cells, ...(Object.fromEntries(travel) as DraftActuator) } };
  });
  return retypeActuators(next);
}

function typeOfActuator(draft: ArmDraft, actuator: number): Joint['type'] {
  const coupling = draft.coupling?.map((row) => row.map(({ value }) => value || 0)) ?? [];
  return actuatorType(draft.joints, coupling, actuator);
}

/** An actuator that now drives another kind of joint keeps its texts. */
function retypeActuators(draft: ArmDraft): ArmDraft {
  if (!draft.actuators) return draft;
  const actuators = draft.actuators.map((actuator, index) => {
    const type = typeOfActuator(draft, index);
    const cells = TRAVEL_COLUMNS.map(({ field }) => {
      const typed = typedCell(actuator[field].text, 'travel', type);
      // The shown text rounds; an untouched number of the same kind keeps its digits.
      const isKept = cellOf(actuator[field].value, 'travel', type).text === actuator[field].text;
      return [field, isKept ? actuator[field] : typed];
    });
    return Object.fromEntries(cells) as DraftActuator;
  });
  return { ...draft, actuators };
}

function setFrameCell(draft: ArmDraft, frame: FrameName, index: number, text: string): ArmDraft {
  const cells = draft[frame];
  const quantity = FRAME_QUANTITIES[index];
  if (!cells || !quantity) return draft;
  return { ...draft, [frame]: replaced(cells, index, typedCell(text, quantity, 'revolute')) };
}

/** Gives the arm a base or tool transform of zeros, or takes it away. */
export function setFrame(draft: ArmDraft, frame: FrameName, wanted: boolean): ArmDraft {
  return { ...draft, [frame]: wanted ? FRAME_QUANTITIES.map((quantity) => cellOf(0, quantity, 'revolute')) : null };
}

const nothing = (): DraftCell => ({ text: '', value: NaN });

/** A joint at the end, to be filled in; under a coupling with an actuator of its own. */
export function addJoint(draft: ArmDraft): ArmDraft {
  if (draft.joints.length >= MOST_JOINTS) return draft;
  const zero = (field: JointField): DraftCell =>
    TRAVEL_COLUMNS.some((column) => column.field === field) ? nothing() : cellOf(0, 'length', 'revolute');
  const cells = Object.fromEntries(JOINT_COLUMNS.map(({ field }) => [field, zero(field)])) as DraftJoint['cells'];
  const joints = [...draft.joints, { key: newKey(), type: 'revolute' as const, cells }];
  if (!draft.coupling) return { ...draft, joints };
  const columns = draft.coupling[0]?.length ?? 0;
  const coupling = [
    ...draft.coupling.map((row) => [...row, plainCell(0)]),
    [...Array.from({ length: columns }, () => plainCell(0)), plainCell(1)],
  ];
  const blank = Object.fromEntries(TRAVEL_COLUMNS.map(({ field }) => [field, nothing()])) as DraftActuator;
  return { ...draft, joints, coupling, actuators: draft.actuators && [...draft.actuators, blank] };
}

/** The last joint stays: an arm has at least one. A square coupling loses the actuator of the same number as well. */
export function removeJoint(draft: ArmDraft, index: number): ArmDraft {
  if (draft.joints.length <= 1 || !draft.joints[index]) return draft;
  const without = <Entry>(list: readonly Entry[]): Entry[] => list.filter((_, at) => at !== index);
  const joints = without(draft.joints);
  if (!draft.coupling) return { ...draft, joints, actuators: draft.actuators && without(draft.actuators) };
  const isSquare = draft.coupling.every((row) => row.length === draft.joints.length);
  const coupling = without(draft.coupling).map((row) => (isSquare ? without(row) : row));
  const actuators = draft.actuators && (isSquare ? without(draft.actuators) : draft.actuators);
  return { ...draft, joints, coupling, actuators };
}

/** Moves a joint towards the tool (+1) or the base (−1), with its row of the coupling. */
export function moveJoint(draft: ArmDraft, index: number, by: 1 | -1): ArmDraft {
  const to = index + by;
  if (!draft.joints[index] || !draft.joints[to]) return draft;
  const swapped = <Entry>(list: readonly Entry[]): Entry[] =>
    list.map((entry, at) => (at === index ? list[to] : at === to ? list[index] : entry));
  const actuators = draft.coupling ? draft.actuators : draft.actuators && swapped(draft.actuators);
  return { ...draft, joints: swapped(draft.joints), coupling: draft.coupling && swapped(draft.coupling), actuators };
}

/** Fills every empty ramp from the speed beside it, for an arm that comes to full speed in so many seconds. */
export function fillRamps(draft: ArmDraft, seconds: number): ArmDraft {
  return {
    ...draft,
    joints: draft.joints.map((joint) => {
      const { maxSpeed, maxAcceleration } = joint.cells;
      if (maxAcceleration.text.trim() !== '' || !(maxSpeed.value > 0)) return joint;
      const cell = cellOf(maxSpeed.value / seconds, 'travel', joint.type);
      return { ...joint, cells: { ...joint.cells, maxAcceleration: cell } };
    }),
  };
}
