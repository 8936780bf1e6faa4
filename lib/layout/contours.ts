import { contours } from 'd3';
import type { FloorGrid, FloorMap } from './floor-map';

/** Lines and outlines of a floor map, in floor millimetres. Cells that are not reached (NaN) bound everything. */

export interface ValueGrid {
  readonly grid: FloorGrid;
  /** Row-major, rows away from the reader; NaN where not reached. */
  readonly value: Float32Array;
}

type PointMm = readonly [number, number];

export interface IsoLabel {
  readonly xMm: number;
  readonly yMm: number;
  /** Direction of the line at the label, counter-clockwise, upright on the screen. */
  readonly angleRad: number;
}

export interface IsoLine {
  readonly value: number;
  readonly lines: readonly (readonly PointMm[])[];
  readonly labels: readonly IsoLabel[];
}

/** One label for so much line, and none on a line shorter than the least. */
const LABEL_EVERY_MM = 4000;
const LEAST_LABELLED_MM = 600;

/**
 * Lines of equal value, with places for their labels. A line stops where the reached floor stops: the edge of reach is no
 * line of equal value.
 */
export function isoLines(map: ValueGrid, levels: readonly number[]): IsoLine[] {
  const trace = contours().size([map.grid.columns, map.grid.rows]);
  const values = spread(map);
  return levels.map((level) => {
    const lines = trace
      .contour(values, level)
      .coordinates.flat()
      .flatMap((ring) => insideParts(map, ring as unknown as PointMm[]))
      .map((line) => line.map((point) => onFloor(map.grid, point)));
    return { value: level, lines, labels: lines.flatMap(labelsOf) };
  });
}

/** Outlines of the reached floor, halfway between reached and other cells: rings in floor mm, holes wound the other way. */
export function reachOutline(map: ValueGrid): PointMm[][] {
  return outlineOf(
    map.grid,
    Array.from(map.value, (value) => (Number.isNaN(value) ? -1 : 1)),
  );
}

/**
 * Outlines of the floor whose value is below the threshold; where reached floor meets reached floor they follow the line of
 * that value. They reach a little beyond the reached floor: clip what is drawn with `reachOutline`.
 */
export function belowOutline(map: ValueGrid, threshold: number): PointMm[][] {
  return outlineOf(
    map.grid,
    spread(map).map((value) => threshold - value),
  );
}

/**
 * Cell edges at which the best robot changes, as x1 y1 x2 y2 after one another, in floor mm. Values jump there, and the
 * line says so.
 *
 * @param owner one number a cell; equal numbers are one realm.
 */
export function realmEdges(map: ValueGrid, owner: Uint8Array): Float32Array {
  return edgesWhere(map, (a, b) => owner[a] !== owner[b]);
}

/** The same where one robot goes on with another branch: its tool cannot pass there without the arm turning over. */
export function branchEdges(map: Pick<FloorMap, 'grid' | 'value' | 'robot' | 'branch'>): Float32Array {
  const { robot, branch } = map;
  return edgesWhere(map, (a, b) => robot[a] === robot[b] && branch[a] !== branch[b]);
}

function edgesWhere(map: ValueGrid, changes: (a: number, b: number) => boolean): Float32Array {
  const { columns, rows, stepMm, originMm } = map.grid;
  const edges: number[] = [];
  const differ = (a: number, b: number) => changes(a, b) && !Number.isNaN(map.value[a] + map.value[b]);
  const x = (column: number) => originMm[0] + (column - 0.5) * stepMm;
  const y = (row: number) => originMm[1] + (row - 0.5) * stepMm;
  for (let row = 0; row < rows; row += 1) {
    for (let column = 0; column < columns; column += 1) {
      const cell = row * columns + column;
      if (column > 0 && differ(cell - 1, cell)) edges.push(x(column), y(row), x(column), y(row + 1));
      if (row > 0 && differ(cell - columns, cell)) edges.push(x(column), y(row), x(column + 1), y(row));
    }
  }
  return Float32Array.from(edges);
}

function outlineOf(grid: FloorGrid, field: number[]): PointMm[][] {
  return contours()
    .size([grid.columns, grid.rows])
    .contour(field, 0)
    .coordinates.flat()
    .map((ring) => ring.map((point) => onFloor(grid, point as unknown as PointMm)));
}

/**
 * The values with one ring of cells round the reached floor that carries the mean of its reached neighbours. Without it a
 * line would bend at the edge and run along it, for a contour cannot pass between a value and none.
 */
function spread({ grid: { columns, rows }, value }: ValueGrid): number[] {
  return Array.from(value, (here, cell) => {
    if (!Number.isNaN(here)) return here;
    const [column, row] = [cell % columns, Math.floor(cell / columns)];
    let [sum, count] = [0, 0];
    for (let y = Math.max(0, row - 1); y <= Math.min(rows - 1, row + 1); y += 1) {
      for (let x = Math.max(0, column - 1); x <= Math.min(columns - 1, column + 1); x += 1) {
        const near = value[y * columns + x];
        if (Number.isNaN(near)) continue;
        sum += near;
        count += 1;
      }
    }
    return count === 0 ? NaN : sum / count;
  });
}

/** d3 counts cell corners from zero; the first cell's centre is at (½, ½). */
function onFloor(grid: FloorGrid, [x, y]: PointMm): PointMm {
  return [grid.originMm[0] + (x - 0.5) * grid.stepMm, grid.originMm[1] + (y - 0.5) * grid.stepMm];
}

/** The parts of a closed ring that run between two reached cells. */
function insideParts(map: ValueGrid, ring: readonly PointMm[]): PointMm[][] {
  const parts: PointMm[][] = [];
  let part: PointMm[] = [];
  for (const point of ring) {
    if (betweenReached(map, point)) {
      part.push(point);
    } else {
      if (part.length > 1) parts.push(part);
      part = [];
    }
  }
  if (part.length > 1) {
    const first = parts[0];
    // The ring's seam may lie in the middle of a part.
    if (first && ring.length > 1 && samePoint(first[0], ring[0])) parts[0] = [...part, ...first.slice(1)];
    else parts.push(part);
  }
  return parts;
}

/** Whether both cell centres between which a contour point lies are reached. */
function betweenReached({ grid, value }: ValueGrid, [x, y]: PointMm): boolean {
  const reached = (column: number, row: number) =>
    column >= 0 &&
    row >= 0 &&
    column < grid.columns &&
    row < grid.rows &&
    !Number.isNaN(value[row * grid.columns + column]);
  return reached(Math.floor(x - 0.5), Math.floor(y - 0.5)) && reached(Math.ceil(x - 0.5), Math.ceil(y - 0.5));
}

function samePoint(a: PointMm, b: PointMm): boolean {
  return a[0] === b[0] && a[1] === b[1];
}

function labelsOf(line: readonly PointMm[]): IsoLabel[] {
  const along = [0];
  for (let index = 1; index < line.length; index += 1) {
    const [x1, y1] = line[index - 1];
    const [x2, y2] = line[index];
    along.push(along[index - 1] + Math.hypot(x2 - x1, y2 - y1));
  }
  const length = along[along.length - 1];
  if (length < LEAST_LABELLED_MM) return [];
  const count = Math.max(1, Math.round(length / LABEL_EVERY_MM));
  return Array.from({ length: count }, (_, index) => {
    const at = ((index + 0.5) / count) * length;
    const end = Math.max(
      1,
      along.findIndex((distance) => distance >= at),
    );
    // The direction over a few points, so that one cell's corner does not turn the label.
    const from = line[Math.max(0, end - 4)];
    const to = line[Math.min(line.length - 1, end + 3)];
    const angle = Math.atan2(to[1] - from[1], to[0] - from[0]);
    const upright = Math.cos(angle) < 0 ? angle + Math.PI : angle;
    return { xMm: line[end][0], yMm: line[end][1], angleRad: upright };
  });
}
