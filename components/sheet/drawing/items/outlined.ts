import type { Fixture, Obstacle } from '@/lib/layout/items';
import type { Palette } from '@/lib/layout/palette';
import { letter, strokeInk, tracePath, type Ink } from '../ink';
import { labelEdge } from './label-edge';

const radians = (degrees: number) => (degrees * Math.PI) / 180;
/** Below this size on the screen a name would only smudge the drawing. */
const LEAST_NAMED_PX = 26;
/** Columns stand in rows and bear dull names: they are named only where there is room. */
const LEAST_NAMED_COLUMN_PX = 60;

/** A fixture's body: outline and crossed diagonals on thin paper, so that the map shows through. Item frame. */
export function drawFixture(ink: Ink, palette: Palette, px: number, fixture: Fixture): void {
  tracePath(ink, fixture.outlineMm, true);
  ink.globalAlpha = 0.82;
  ink.fillStyle = palette.sheet;
  ink.fill();
  ink.globalAlpha = 1;

  const xs = fixture.outlineMm.map(([x]) => x);
  const ys = fixture.outlineMm.map(([, y]) => y);
  const [left, right, bottom, top] = [Math.min(...xs), Math.max(...xs), Math.min(...ys), Math.max(...ys)];
  ink.save();
  ink.clip();
  ink.globalAlpha = 0.45;
  ink.beginPath();
  if (fixture.outlineMm.length === 4) {
    const [a, b, c, d] = fixture.outlineMm;
    for (const [from, to] of [
      [a, c],
      [b, d],
    ]) {
      ink.moveTo(...from);
      ink.lineTo(...to);
    }
  } else {
    ink.moveTo(left, bottom);
    ink.lineTo(right, top);
    ink.moveTo(left, top);
    ink.lineTo(right, bottom);
  }
  strokeInk(ink, palette.ink, 0.8 * px);
  ink.restore();

  tracePath(ink, fixture.outlineMm, true);
  ink.lineJoin = 'miter';
  strokeInk(ink, palette.ink, 1.6 * px);
}

/** An obstacle's body: solid, quieter than a fixture; a column of the building as cut material is drawn. */
export function drawObstacle(ink: Ink, palette: Palette, px: number, obstacle: Obstacle): void {
  tracePath(ink, obstacle.outlineMm, true);
  ink.fillStyle = palette.hair;
  ink.fill();
  if (obstacle.form === 'column') hatchColumn(ink, palette, px, obstacle);
  strokeInk(ink, palette.inkSoft, 1.4 * px);
}

const HATCH_PX = 6;

/** Cut material is hatched at 45° on the drawing, however the column is turned. The outline stays the current path. */
function hatchColumn(ink: Ink, palette: Palette, px: number, { outlineMm, angleDeg }: Obstacle): void {
  const reach = Math.max(...outlineMm.map(([x, y]) => Math.hypot(x, y)));
  // A column of a few pixels would only turn grey.
  if (reach < HATCH_PX * px) return;
  ink.save();
  ink.clip();
  ink.rotate(radians(45 - angleDeg));
  ink.beginPath();
  const pitch = Math.max(HATCH_PX * px, reach / 40);
  for (let y = -Math.ceil(reach / pitch) * pitch; y <= reach; y += pitch) {
    ink.moveTo(-reach, y);
    ink.lineTo(reach, y);
  }
  ink.globalAlpha = 0.6;
  strokeInk(ink, palette.inkSoft, 0.7 * px);
  ink.restore();
  tracePath(ink, outlineMm, true);
}

/** The name of a fixture or obstacle along its lower edge; left out where the thing is too small to be named. */
export function drawOutlineName(ink: Ink, palette: Palette, px: number, item: Fixture | Obstacle): void {
  const edge = labelEdge(item.outlineMm, radians(item.angleDeg));
  const isColumn = item.kind === 'obstacle' && item.form === 'column';
  if (edge.lengthMm / px < (isColumn ? LEAST_NAMED_COLUMN_PX : LEAST_NAMED_PX)) return;
  letter(ink, palette, px, {
    text: item.name,
    xMm: edge.xMm,
    yMm: edge.yMm,
    angleRad: edge.angleRad,
    offsetPx: [0, 10 * edge.side],
    weight: item.kind === 'fixture' ? 600 : 500,
    colour: item.kind === 'fixture' ? palette.ink : palette.inkSoft,
  });
}
