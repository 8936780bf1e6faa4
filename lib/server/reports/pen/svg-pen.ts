import { textRuns, textWidth } from './fonts';
import type { Matrix, PathStyle, Pen, Picture, Ring, TextStyle } from './pen';

const number = (value: number): string => String(Math.round(value * 1000) / 1000);

/** Collects a page as SVG. Letters become outlines, so the picture needs no fonts on the machine that renders it. */
export class SvgPen implements Pen {
  private readonly parts: string[] = [];
  private clips = 0;

  constructor(
    private readonly widthPt: number,
    private readonly heightPt: number,
  ) {}

  path(rings: readonly Ring[], style: PathStyle): void {
    const { fill, fillOpacity = 1, stroke, strokeOpacity = 1, width = 1, dash, round } = style;
    const look = [
      `fill="${fill ?? 'none'}" fill-rule="evenodd"`,
      fill && fillOpacity < 1 ? `fill-opacity="${fillOpacity}"` : '',
      stroke ? `stroke="${stroke}" stroke-width="${number(width)}"` : '',
      stroke && strokeOpacity < 1 ? `stroke-opacity="${strokeOpacity}"` : '',
      dash?.length ? `stroke-dasharray="${dash.map(number).join(' ')}"` : '',
      round ? 'stroke-linecap="round" stroke-linejoin="round"' : '',
    ];
    this.parts.push(`<path d="${tracedPath(rings)}" ${look.filter(Boolean).join(' ')}/>`);
  }

  text(text: string, x: number, y: number, style: TextStyle): void {
    const { face = 'sans', size, colour = '#1b2733', align = 'left', angleDeg = 0 } = style;
    const width = textWidth(text, face, size);
    let at = -(align === 'center' ? width / 2 : align === 'right' ? width : 0);
    const outlines: string[] = [];
    for (const { part, text: run } of textRuns(text, face)) {
      const scale = size / part.font.unitsPerEm;
      const { glyphs, positions } = part.font.layout(run);
      glyphs.forEach((glyph, index) => {
        const { xAdvance, xOffset, yOffset } = positions[index];
        outlines.push(
          glyph.path
            .scale(scale, -scale)
            .translate(at + xOffset * scale, -yOffset * scale)
            .toSVG(),
        );
        at += xAdvance * scale;
      });
    }
    const turn = angleDeg === 0 ? '' : ` rotate(${number(-angleDeg)})`;
    const place = `translate(${number(x)} ${number(y)})${turn}`;
    this.parts.push(`<path transform="${place}" d="${outlines.join('')}" fill="${colour}"/>`);
  }

  picture(
    picture: Picture,
    matrix: Matrix,
    { multiply = false, opacity = 1 }: { readonly multiply?: boolean; readonly opacity?: number } = {},
  ): void {
    const source = `data:${picture.mediaType};base64,${Buffer.from(picture.bytes).toString('base64')}`;
    const blend = multiply ? ' style="mix-blend-mode:multiply"' : '';
    this.parts.push(
      `<image transform="matrix(${matrix.join(' ')})" width="${picture.widthPx}" height="${picture.heightPx}" ` +
        `preserveAspectRatio="none" opacity="${opacity}"${blend} href="${source}"/>`,
    );
  }

  within(rings: readonly Ring[], draw: () => void): void {
    this.clips += 1;
    const id = `clip-${this.clips}`;
    this.parts.push(`<clipPath id="${id}"><path clip-rule="evenodd" d="${tracedPath(rings)}"/></clipPath>`);
    this.parts.push(`<g clip-path="url(#${id})">`);
    draw();
    this.parts.push('</g>');
  }

  svg(): string {
    const [width, height] = [number(this.widthPt), number(this.heightPt)];
    return (
      `<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${height}" viewBox="0 0 ${width} ${height}">` +
      `<rect width="100%" height="100%" fill="#ffffff"/>${this.parts.join('')}</svg>`
    );
  }
}

function tracedPath(rings: readonly Ring[]): string {
  return rings
    .map(({ points, closed }) => {
      const corners = points.map(([x, y], index) => `${index === 0 ? 'M' : 'L'}${number(x)} ${number(y)}`);
      return corners.join('') + (closed ? 'Z' : '');
    })
    .join('');
}
