import { armSchema, type ArmDefinition } from '@/lib/contracts/arm';
import { armContentSchema, type ArmContent } from '@/lib/contracts/arms';
import { JOINT_COLUMNS, TRAVEL_COLUMNS, type TravelField } from '@/lib/layout/arm-columns';
import type { ArmDraft, DraftCell, DraftFrame } from './draft';

export interface DraftProblem {
  /** The cells concerned, as the schema names them; the first is the one to go to. */
  readonly paths: readonly string[];
  readonly message: string;
}

export interface CheckedDraft {
  /** What can be saved; null while there are problems. */
  readonly content: ArmContent | null;
  /** The chain, good enough to be drawn though its name or ramps are missing; null while it is not. */
  readonly definition: ArmDefinition | null;
  readonly problems: readonly DraftProblem[];
}

/** Reads a draft by the schema that the server applies, and says what is wrong with it in plain words. */
export function checkDraft(draft: ArmDraft): CheckedDraft {
  const missing = missingCells(draft);
  const definition = definitionOf(draft, missing);
  const parsed = armContentSchema.safeParse({
    name: draft.name,
    description: draft.description,
    payloadKg: draft.payloadKg.text.trim() === '' ? null : draft.payloadKg.value,
    definition,
  });
  const gone = new Set(missing.flatMap(({ paths }) => paths));
  const refused = parsed.success
    ? []
    : parsed.error.issues
        .map(({ path, message }) => ({ path: path.join('.').replace(/^definition\./, ''), message }))
        .filter(({ path }) => !isAbout(path, gone))
        .map(({ path, message }) => ({ paths: [path], message: named(path, message) }));
  const problems = [...missing, ...refused];
  // Nothing that is drawn depends on the ramps, which a URDF file leaves open.
  const canBeDrawn = missing.every(({ paths }) => paths.every((path) => path.endsWith('.maxAcceleration')));
  const chain = canBeDrawn ? armSchema.safeParse(definition) : null;
  return {
    content: problems.length === 0 && parsed.success ? parsed.data : null,
    definition: chain?.success ? chain.data : null,
    problems,
  };
}

/** A limit is not compared with one that is still to be written. */
function isAbout(path: string, gone: ReadonlySet<string>): boolean {
  return gone.has(path) || (path.endsWith('.min') && gone.has(path.replace(/min$/, 'max')));
}

const LABELS: Record<string, string> = Object.fromEntries(JOINT_COLUMNS.map(({ field, label }) => [field, label]));
const AXES = ['x', 'y', 'z'];
const TURNS = ['roll', 'pitch', 'yaw'];

/** Puts the name of the cell before words that do not begin with it. */
function named(path: string, message: string): string {
  if (/^(Joint|Actuator) \d/.test(message)) return message;
  const [part, first, second] = path.split('.');
  if (part === 'joints' && second) return `Joint ${Number(first) + 1}, ${LABELS[second] ?? second}: ${message}`;
  if (part === 'actuators' && second) return `Actuator ${Number(first) + 1}, ${LABELS[second] ?? second}: ${message}`;
  if (part === 'coupling' && second)
    return `Coupling, joint ${Number(first) + 1}, actuator ${Number(second) + 1}: ${message}`;
  if (part === 'base' || part === 'tool') {
    const word = (first === 'rpy' ? TURNS : AXES)[Number(second)] ?? '';
    return `${part === 'base' ? 'Base' : 'Tool'}, ${word}: ${message}`;
  }
  return message;
}

interface Missing extends DraftProblem {
  readonly paths: readonly string[];
}

/** Cells without a readable number: empty ones of a row are told in one sentence, unreadable ones each for itself. */
function missingCells(draft: ArmDraft): Missing[] {
  const problems: Missing[] = [];
  const row = (label: string, path: string, cells: readonly (readonly [string, string, DraftCell])[]): void => {
    const open = cells.filter(([, , { value }]) => Number.isNaN(value));
    const empty = open.filter(([, , { text }]) => text.trim() === '');
    if (empty.length > 0)
      problems.push({
        paths: empty.map(([field]) => `${path}.${field}`),
        message: `${label}: fill in ${listed(empty.map(([, word]) => word))}.`,
      });
    for (const [field, word, { text }] of open)
      if (text.trim() !== '')
        problems.push({ paths: [`${path}.${field}`], message: `${label}, ${word}: “${text.trim()}” is no number.` });
  };
  draft.joints.forEach(({ cells }, index) =>
    row(
      `Joint ${index + 1}`,
      `joints.${index}`,
      JOINT_COLUMNS.map(({ field, label }) => [field, label, cells[field]]),
    ),
  );
  draft.actuators?.forEach((cells, index) =>
    row(
      `Actuator ${index + 1}`,
      `actuators.${index}`,
      TRAVEL_COLUMNS.map(({ field, label }) => [field, label, cells[field]]),
    ),
  );
  draft.coupling?.forEach((cells, index) =>
    row(
      `Coupling, joint ${index + 1}`,
      `coupling.${index}`,
      cells.map((cell, at) => [String(at), `actuator ${at + 1}`, cell]),
    ),
  );
  for (const frame of ['base', 'tool'] as const)
    if (draft[frame]) row(frame === 'base' ? 'Base' : 'Tool', frame, frameCells(draft[frame]));
  if (Number.isNaN(draft.payloadKg.value) && draft.payloadKg.text.trim() !== '')
    problems.push({ paths: ['payloadKg'], message: `Payload: “${draft.payloadKg.text.trim()}” is no number.` });
  return problems;
}

const frameCells = (frame: DraftFrame): (readonly [string, string, DraftCell])[] =>
  frame.map((cell, at) => [at < 3 ? `xyz.${at}` : `rpy.${at - 3}`, [...AXES, ...TURNS][at], cell]);

function listed(words: readonly string[]): string {
  return words.length < 2 ? words.join('') : `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`;
}

/** Stands in for a missing number while the rest is checked: it breaks no rule by itself. */
const STAND_IN: Record<TravelField, number> = { min: -1000, max: 1000, maxSpeed: 1, maxAcceleration: 1 };

function definitionOf(draft: ArmDraft, missing: readonly Missing[]): unknown {
  const isWhole = missing.length === 0;
  const figure = (cell: DraftCell, standIn = 0): number =>
    isWhole || !Number.isNaN(cell.value) ? cell.value : standIn;
  const travel = (cells: Readonly<Record<TravelField, DraftCell>>) =>
    Object.fromEntries(TRAVEL_COLUMNS.map(({ field }) => [field, figure(cells[field], STAND_IN[field])]));
  const frame = (cells: DraftFrame | null) => {
    const figures = cells?.map((cell) => figure(cell));
    return figures && { xyz: figures.slice(0, 3), rpy: figures.slice(3) };
  };
  return {
    convention: draft.convention,
    joints: draft.joints.map(({ type, cells }) => ({
      type,
      a: figure(cells.a),
      alpha: figure(cells.alpha),
      d: figure(cells.d),
      theta: figure(cells.theta),
      ...travel(cells),
    })),
    ...(draft.base && { base: frame(draft.base) }),
    ...(draft.tool && { tool: frame(draft.tool) }),
    ...(draft.freedoms && { freedoms: draft.freedoms }),
    ...(draft.coupling && { coupling: draft.coupling.map((row) => row.map((cell) => figure(cell))) }),
    ...(draft.actuators && { actuators: draft.actuators.map(travel) }),
  };
}
