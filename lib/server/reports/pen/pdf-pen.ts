import PDFDocument from 'pdfkit';
import { FACES, fontParts, textRuns, textWidth } from './fonts';
import type { Matrix, PathStyle, Pen, Picture, Ring, TextStyle } from './pen';

type Document = PDFKit.PDFDocument;

/** A document whose pages are added one by one, with the shipped fonts in it. */
export function openPdf(info: { title: string; author: string }): Document {
  const document = new PDFDocument({
    // Blending and transparency came with 1.4.
    pdfVersion: '1.7',
    autoFirstPage: false,
    bufferPages: true,
    margin: 0,
    lang: 'en',
    displayTitle: true,
    info: { Title: info.title, Author: info.author, Creator: 'Elbowroom', Producer: 'Elbowroom' },
  });
  for (const face of FACES) for (const { name, bytes } of fontParts(face)) document.registerFont(name, bytes);
  return document;
}

/** Everything that was drawn, once the document has been ended. */
export async function pdfBytes(document: Document): Promise<Buffer> {
  const chunks: Buffer[] = [];
  document.on('data', (chunk: Buffer) => chunks.push(chunk));
  const ended = new Promise<void>((resolve, reject) => {
    document.on('end', () => resolve());
    document.on('error', reject);
  });
  document.end();
  await ended;
  return Buffer.concat(chunks);
}

/** Draws on the document's current page. */
export class PdfPen implements Pen {
  constructor(private readonly document: Document) {}

  path(rings: readonly Ring[], style: PathStyle): void {
    const { document } = this;
    document.save();
    this.trace(rings);
    document.lineWidth(style.width ?? 1);
    document.lineCap(style.round ? 'round' : 'butt').lineJoin(style.round ? 'round' : 'miter');
    if (style.dash?.length) document.dash(style.dash[0], { space: style.dash[1] ?? style.dash[0] });
    if (style.dash && style.dash.length > 2) document.addContent(`[${style.dash.join(' ')}] 0 d`);
    if (style.fill) document.fillColor(style.fill, style.fillOpacity ?? 1);
    if (style.stroke) document.strokeColor(style.stroke, style.strokeOpacity ?? 1);
    if (style.fill && style.stroke) document.fillAndStroke(undefined, undefined, 'even-odd');
    else if (style.fill) document.fill('even-odd');
    else document.stroke();
    document.restore();
  }

  text(text: string, x: number, y: number, style: TextStyle): void {
    const { document } = this;
    const { face = 'sans', size, colour = '#1b2733', align = 'left', angleDeg = 0 } = style;
    const width = textWidth(text, face, size);
    document.save();
    if (angleDeg !== 0) document.rotate(-angleDeg, { origin: [x, y] });
    let at = x - (align === 'center' ? width / 2 : align === 'right' ? width : 0);
    for (const run of textRuns(text, face)) {
      document.font(run.part.name).fontSize(size).fillColor(colour, 1);
      document.text(run.text, at, y, { lineBreak: false, baseline: 'alphabetic' });
      at += (run.part.font.layout(run.text).advanceWidth / run.part.font.unitsPerEm) * size;
    }
    document.restore();
  }

  picture(
    picture: Picture,
    matrix: Matrix,
    { multiply = false, opacity = 1 }: { readonly multiply?: boolean; readonly opacity?: number } = {},
  ): void {
    const { document } = this;
    document.save();
    if (multiply) this.blendMultiply();
    if (opacity < 1) document.opacity(opacity);
    document.transform(...matrix);
    const source = `data:${picture.mediaType};base64,${Buffer.from(picture.bytes).toString('base64')}`;
    document.image(source, 0, 0, { width: picture.widthPx, height: picture.heightPx });
    document.restore();
  }

  within(rings: readonly Ring[], draw: () => void): void {
    this.document.save();
    this.trace(rings);
    this.document.clip('even-odd');
    draw();
    this.document.restore();
  }

  private trace(rings: readonly Ring[]): void {
    for (const { points, closed } of rings) {
      points.forEach(([x, y], index) => (index === 0 ? this.document.moveTo(x, y) : this.document.lineTo(x, y)));
      if (closed && points.length > 0) this.document.closePath();
    }
  }

  /** The library has no blend modes of its own: a graphics state by the PDF standard's name (ISO 32000-1, 11.6.3). */
  private blendMultiply(): void {
    const { document } = this;
    const state = document.ref({ Type: 'ExtGState', BM: 'Multiply' });
    state.end(undefined as unknown as Buffer);
    const page = document.page as unknown as { ext_gstates: Record<string, unknown> };
    page.ext_gstates.Multiply = state;
    document.addContent('/Multiply gs');
  }
}
