import { stringify } from 'csv-stringify/sync';

export type CsvCell = string | number | boolean | null;

/** What a table program would take for a formula, or for the end of a cell. */
const DANGEROUS_START = /^[=+\-@\t\r\n]/;

/** Text that cannot run: an apostrophe in front makes every common table program show the rest as it is. */
export function harmless(text: string): string {
  return DANGEROUS_START.test(text) ? `'${text}` : text;
}

/**
 * A table as CSV (RFC 4180: commas, CRLF, quotes where needed), its first line the names of the columns. Numbers are written as
 * numbers, with a full stop and every digit, a minus sign included; text that starts like a formula is made harmless. The mark
 * in front tells table programs that it is UTF-8.
 */
export function csvOf(columns: readonly string[], rows: readonly (readonly CsvCell[])[]): string {
  const cell = (value: CsvCell): string | number =>
    typeof value === 'string' ? harmless(value) : typeof value === 'boolean' ? (value ? 'yes' : 'no') : (value ?? '');
  const body = rows.map((row) =>
    row.map((value) => cell(typeof value === 'number' && !Number.isFinite(value) ? null : value)),
  );
  return stringify([columns.map(harmless), ...body], { bom: true, record_delimiter: 'windows' });
}
