import Papa from 'papaparse';
import type { Arm, Joint } from '@/lib/kinematics/types';
import { JOINT_COLUMNS, KIND_WORDS, shownUnit, storedFrom, type JointField } from '../arm-columns';
import { answering, demandSize, Refused, refuse, type Imported, type ImportedArm, type Refusal } from './imported-arm';
import { armOfFacts, noFacts, readFact, writeFacts } from './table-facts';
import { readHeader, type TableColumn } from './table-header';
import { decimalMark, readNumber, shortestText, type NumberCell } from './table-numbers';

/**
 * A table of Denavit-Hartenberg rows as text: a header that names columns with their units, one line a joint, separated by
 * commas, semicolons or tabs. Lines that begin with # say what no column can (see table-facts).
 */

const MOST_LINES = 500;
const SEPARATORS = ['\t', ';', ','] as const;
const KINDS: Record<string, Joint['type']> = {
  turns: 'revolute',
  turning: 'revolute',
  revolute: 'revolute',
  r: 'revolute',
  slides: 'prismatic',
  sliding: 'prismatic',
  prismatic: 'prismatic',
  p: 'prismatic',
};

interface Row {
  readonly line: number;
  readonly cells: readonly string[];
}

/** Reads a table; refuses it with every cell named that cannot be read. An empty cell is left open (NaN). */
export function readArmTable(text: string): Imported<ImportedArm> {
  return answering(() => {
    demandSize(text);
    const facts = noFacts();
    const lines: { line: number; text: string }[] = [];
    text
      .replace(/^\ufeff/, '')
      .split(/\r\n|\n|\r/)
      .forEach((content, index) => {
        if (content.trimStart().startsWith('#')) readFact(content.trimStart(), index + 1, facts);
        else if (/[^\s,;]/.test(content)) lines.push({ line: index + 1, text: content });
      });
    if (lines.length === 0) refuse('The file holds no table.');
    if (lines.length > MOST_LINES) refuse(`The table has ${lines.length} lines; no arm has that many joints.`);
    const separator =
      SEPARATORS.find((each) => lines[0].text.includes(each)) ??
      refuse(
        'The first line is no header: write the names of the columns with commas, semicolons or tabs between them.',
        `Line ${lines[0].line}`,
      );
    const rows = lines.map(({ line, text: content }): Row => ({ line, cells: splitLine(content, separator, line) }));
    const columns = readHeader(rows[0].cells, rows[0].line);
    if (rows.length < 2) refuse('There is no joint under the header.');
    const joints = readJoints(rows.slice(1), columns);
    const notes = facts.convention
      ? []
      : ['The file does not say which convention it follows; the rows were read as standard DH.'];
    return {
      name: facts.name,
      description: facts.description.join('\n'),
      payloadKg: facts.payloadKg,
      arm: armOfFacts(joints, facts),
      sources: rows.slice(1).map(({ line }) => `line ${line}`),
      notes,
    };
  });
}

function splitLine(text: string, delimiter: string, line: number): string[] {
  const { data, errors } = Papa.parse<string[]>(text, { delimiter, newline: '\n' });
  if (errors.length > 0) refuse('A quotation mark is opened and not closed.', `Line ${line}`);
  return data[0] ?? [];
}

function readJoints(rows: readonly Row[], columns: readonly TableColumn[]): Joint[] {
  const where = (row: Row, column: TableColumn): string => `Line ${row.line}, column ${column.label}`;
  for (const row of rows)
    if (row.cells.slice(columns.length).some((cell) => cell.trim() !== '') || row.cells.length < columns.length)
      refuse(
        `There are ${row.cells.length} cells, the header has ${columns.length}. A decimal comma in a table with commas between its columns needs quotation marks.`,
        `Line ${row.line}`,
      );
  const numbers = columns.filter((column) => column.field !== 'type' && column.field !== 'joint');
  const cells = rows.flatMap((row) =>
    numbers.map((column): NumberCell => ({ text: row.cells[columns.indexOf(column)], where: where(row, column) })),
  );
  const decimals = decimalMark(cells);
  if ('doubt' in decimals) return refuse(decimals.message, decimals.doubt.where);
  const refusals: Refusal[] = [];
  const joints = rows.map((row, index): Joint => {
    const cellOf = (column: TableColumn): string => row.cells[columns.indexOf(column)].trim();
    const object = (column: TableColumn, message: string): void =>
      void refusals.push({ where: where(row, column), message });
    const kindColumn = columns.find(({ field }) => field === 'type')!;
    const type = KINDS[cellOf(kindColumn).toLowerCase()];
    if (!type) object(kindColumn, `“${cellOf(kindColumn)}” is no kind of joint: write turns or slides.`);
    const numberColumn = columns.find(({ field }) => field === 'joint');
    if (numberColumn && cellOf(numberColumn).replace(/^j/i, '') !== String(index + 1))
      object(
        numberColumn,
        `Joint ${index + 1} is due here, from the base to the tool; “${cellOf(numberColumn)}” stands there.`,
      );
    const joint: Record<JointField, number> = {
      a: 0,
      alpha: 0,
      d: 0,
      theta: 0,
      min: 0,
      max: 0,
      maxSpeed: 0,
      maxAcceleration: 0,
    };
    for (const column of numbers) {
      const value = readNumber(cellOf(column), decimals.mark);
      if (value === null) object(column, `“${cellOf(column)}” is no number.`);
      const unit = type && column.units[type];
      if (type && !unit)
        object(
          column,
          `Joint ${index + 1} ${KIND_WORDS[type]}, and the header gives no unit for that: write for instance “(deg or mm)”.`,
        );
      joint[column.field as JointField] = unit ? storedFrom(value ?? NaN, unit) : NaN;
    }
    return { type: type ?? 'revolute', ...joint };
  });
  if (refusals.length > 0) throw new Refused(refusals);
  return joints;
}

const HEADER = [
  'joint',
  'kind',
  'a (mm)',
  'alpha (deg)',
  'd (mm)',
  'theta (deg)',
  'from (deg or mm)',
  'to (deg or mm)',
  'speed (deg/s or mm/s)',
  'ramp (deg/s2 or mm/s2)',
];

/** The table that `readArmTable` reads back as the same arm. Commas between columns, points for decimals. */
export function writeArmTable(of: {
  name: string;
  description: string;
  payloadKg: number | null;
  definition: Arm;
}): string {
  const rows = of.definition.joints.map((joint, index) => [
    String(index + 1),
    KIND_WORDS[joint.type],
    ...JOINT_COLUMNS.map(({ field, quantity }) => shortestText(joint[field], shownUnit(quantity, joint.type))),
  ]);
  const table = Papa.unparse([HEADER, ...rows], { newline: '\r\n' });
  return [...writeFacts(of.name, of.description, of.payloadKg, of.definition), table, ''].join('\r\n');
}
