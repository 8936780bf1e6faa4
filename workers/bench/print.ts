/** Plain tables on standard output. */

export type Row = readonly string[];

export function title(text: string) {
  process.stdout.write(`\n${text}\n`);
}

export function say(text: string) {
  process.stdout.write(`  ${text}\n`);
}

/** First column to the left, the others to the right. */
export function table(head: Row, rows: readonly Row[]) {
  const all = [head, ...rows];
  const widths = head.map((_, column) => Math.max(...all.map((row) => (row[column] ?? '').length)));
  all.forEach((row, index) => {
    const cells = row.map((cell, column) => (column === 0 ? cell.padEnd(widths[0]) : cell.padStart(widths[column])));
    process.stdout.write(`  ${cells.join('  ')}\n`);
    if (index === 0) process.stdout.write(`  ${widths.map((width) => '-'.repeat(width)).join('  ')}\n`);
  });
}

export const ratio = (value: number): string => `${value >= 100 ? value.toFixed(0) : value.toFixed(2)}×`;
export const perSecond = (value: number): string => Math.round(value).toLocaleString('en').replace(/,/g, ' ');
export const milliseconds = (seconds: number): string => `${(seconds * 1000).toFixed(2)} ms`;
