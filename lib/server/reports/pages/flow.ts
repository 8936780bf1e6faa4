import { PRINT_PALETTE } from '@/lib/layout/palette';
import type { Box } from '../paper';
import type { Face } from '../pen/fonts';
import { rectangle, segment, wrapped, type Pen } from '../pen/pen';

const { ink, inkSoft, hair, paper } = PRINT_PALETTE;

export interface CellStyle {
  readonly colour?: string;
  readonly face?: Face;
}
export type FlowCell = string | ({ readonly text: string } & CellStyle);

export interface FlowColumn {
  readonly title: string;
  /** Share of the width. */
  readonly share: number;
  readonly figures?: boolean;
}

const SIZE = 8;
const LINE = 10.4;
const PAD = 3.5;

/** Text and tables that run on over as many pages as they need. */
export class Flow {
  private pen: Pen;
  private y: number;

  /** @param openPage starts a page, with its head and foot, and gives the pen to draw on it. */
  constructor(
    private readonly openPage: () => Pen,
    private readonly box: Box,
  ) {
    this.pen = openPage();
    this.y = box.y;
  }

  private get bottom(): number {
    return this.box.y + this.box.height;
  }

  /** Goes on on a new page where less than this is left. */
  need(height: number): void {
    if (this.y + height <= this.bottom || this.y === this.box.y) return;
    this.nextPage();
  }

  nextPage(): void {
    this.pen = this.openPage();
    this.y = this.box.y;
  }

  heading(text: string): void {
    this.need(70);
    this.y += this.y === this.box.y ? 18 : 24;
    this.pen.text(text, this.box.x, this.y, { size: 13, face: 'sans-bold' });
    this.y += 5;
    const { x, width } = this.box;
    this.pen.path([segment([x, this.y], [x + width, this.y])], { stroke: ink, width: 0.9 });
    this.y += 3;
  }

  paragraph(text: string, style: CellStyle & { readonly size?: number; readonly width?: number } = {}): void {
    const { size = SIZE + 0.5, colour = ink, face = 'sans' } = style;
    for (const line of wrapped(text, style.width ?? Math.min(this.box.width, 560), size, face)) {
      this.need(size * 1.35);
      this.y += size * 1.35;
      this.pen.text(line, this.box.x, this.y, { size, colour, face });
    }
    this.y += 4;
  }

  /** A paragraph with a rule beside it, so that it is not read past. */
  caution(text: string): void {
    const size = SIZE + 0.5;
    const lines = wrapped(text, Math.min(this.box.width, 560) - 12, size);
    const height = lines.length * size * 1.35 + 5;
    this.need(height);
    this.pen.path([rectangle(this.box.x, this.y + 3, 2, height - 3)], { fill: PRINT_PALETTE.red });
    for (const line of lines) {
      this.y += size * 1.35;
      this.pen.text(line, this.box.x + 9, this.y, { size });
    }
    this.y += 7;
  }

  /** Label and value, one below another. */
  facts(rows: readonly (readonly [label: string, value: string])[], labelWidth = 150): void {
    for (const [label, value] of rows) {
      const lines = wrapped(value || '–', Math.min(this.box.width, 620) - labelWidth, SIZE);
      this.need(lines.length * LINE + 3);
      this.pen.text(label, this.box.x, this.y + LINE, { size: SIZE, colour: inkSoft });
      for (const line of lines) {
        this.y += LINE;
        this.pen.text(line, this.box.x + labelWidth, this.y, { size: SIZE });
      }
      this.y += 2.5;
      this.rule(hair, Math.min(this.box.width, 620));
    }
    this.y += 6;
  }

  /** @param width in points; the page's unless given. */
  table(columns: readonly FlowColumn[], rows: readonly (readonly FlowCell[])[], width = this.box.width): void {
    const whole = columns.reduce((sum, { share }) => sum + share, 0);
    const widths = columns.map(({ share }) => (share / whole) * width);
    this.need(60);
    this.tableHead(columns, widths);
    for (const row of rows) {
      const cells = row.map((cell, index) => {
        const { text, face, colour } =
          typeof cell === 'string' ? { text: cell, face: undefined, colour: undefined } : cell;
        const chosen = face ?? (columns[index].figures ? 'mono' : 'sans');
        const size = columns[index].figures ? SIZE - 0.8 : SIZE;
        return { lines: wrapped(text, widths[index] - 2 * PAD, size, chosen), face: chosen, size, colour };
      });
      const height = Math.max(...cells.map(({ lines }) => lines.length)) * LINE + 4;
      if (this.y + height > this.bottom) {
        this.nextPage();
        this.tableHead(columns, widths);
      }
      let { x } = this.box;
      cells.forEach(({ lines, face, size, colour }, index) => {
        const right = columns[index].figures === true;
        lines.forEach((line, at) =>
          this.pen.text(line, right ? x + widths[index] - PAD : x + PAD, this.y + (at + 1) * LINE, {
            size,
            face,
            colour,
            align: right ? 'right' : 'left',
          }),
        );
        x += widths[index];
      });
      this.y += height;
      this.rule(hair, width);
    }
    this.y += 8;
  }

  private tableHead(columns: readonly FlowColumn[], widths: readonly number[]): void {
    const titles = columns.map(({ title }, index) => wrapped(title, widths[index] - 2 * PAD, 7));
    const height = Math.max(...titles.map((lines) => lines.length)) * 8.6 + 6;
    this.y += 5;
    const width = widths.reduce((sum, each) => sum + each, 0);
    this.pen.path([rectangle(this.box.x, this.y, width, height)], { fill: paper, fillOpacity: 0.7 });
    let { x } = this.box;
    titles.forEach((lines, index) => {
      const right = columns[index].figures === true;
      lines.forEach((line, at) =>
        this.pen.text(line, right ? x + widths[index] - PAD : x + PAD, this.y + 9 + at * 8.6, {
          size: 7,
          colour: inkSoft,
          align: right ? 'right' : 'left',
        }),
      );
      x += widths[index];
    });
    this.y += height;
    this.rule(ink, width);
  }

  private rule(colour: string, width: number): void {
    const { x } = this.box;
    this.pen.path([segment([x, this.y], [x + width, this.y])], { stroke: colour, width: 0.5 });
  }
}
