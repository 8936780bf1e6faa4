import { NO_ROBOT, type FloorGrid, type FloorMap } from './floor-map';

/** Numbers of a composite: areas, histogram, and what changes between two arrangements. Areas in m². */

export function cellAreaM2(grid: FloorGrid): number {
  return (grid.stepMm / 1000) ** 2;
}

/** Floor that at least one robot reaches. */
export function reachedAreaM2(map: FloorMap): number {
  let cells = 0;
  for (const count of map.reachedBy) if (count > 0) cells += 1;
  return cells * cellAreaM2(map.grid);
}

/** Floor that two or more robots reach: where they can meet. */
export function sharedAreaM2(map: FloorMap): number {
  let cells = 0;
  for (const count of map.reachedBy) if (count > 1) cells += 1;
  return cells * cellAreaM2(map.grid);
}

/** Floor whose value is at the threshold or above it. */
export function areaAtOrAboveM2(map: FloorMap, threshold: number): number {
  // Values are stored in single precision; the threshold must be rounded alike, or a value equal to it falls short.
  const limit = Math.fround(threshold);
  let cells = 0;
  for (const value of map.value) if (value >= limit) cells += 1;
  return cells * cellAreaM2(map.grid);
}

/**
 * Floor area by value. `edges` ascend; bar i holds edges[i] ≤ value < edges[i + 1], the last bar its upper edge too. Values
 * beyond the ends count in the first and the last bar, as the colours of the map do.
 */
export function floorHistogramM2(map: FloorMap, edges: readonly number[]): number[] {
  const bars = new Array<number>(Math.max(edges.length - 1, 0)).fill(0);
  if (bars.length === 0) return bars;
  const limits = Float32Array.from(edges);
  for (const value of map.value) {
    if (Number.isNaN(value)) continue;
    let [low, high] = [0, bars.length - 1];
    while (low < high) {
      const middle = (low + high + 1) >> 1;
      if (value >= limits[middle]) low = middle;
      else high = middle - 1;
    }
    bars[low] += 1;
  }
  const area = cellAreaM2(map.grid);
  return bars.map((cells) => cells * area);
}

export interface FloorSpot {
  readonly xMm: number;
  readonly yMm: number;
  readonly value: number;
  /** Index of the robot among the maps of the composite. */
  readonly robot: number;
}

/** The reached spots with the least and the greatest value; null where nothing is reached. */
export function extremeSpots(map: FloorMap): { readonly worst: FloorSpot; readonly best: FloorSpot } | null {
  let [worst, best] = [-1, -1];
  for (let cell = 0; cell < map.value.length; cell += 1) {
    if (map.robot[cell] === NO_ROBOT) continue;
    if (worst < 0 || map.value[cell] < map.value[worst]) worst = cell;
    if (best < 0 || map.value[cell] > map.value[best]) best = cell;
  }
  return worst < 0 ? null : { worst: spotOf(map, worst), best: spotOf(map, best) };
}

/** What the composite says at a point of the floor; null off the grid or where no robot reaches. */
export function floorSpotAt(map: FloorMap, xMm: number, yMm: number): FloorSpot | null {
  const { originMm, stepMm, columns, rows } = map.grid;
  const column = Math.round((xMm - originMm[0]) / stepMm);
  const row = Math.round((yMm - originMm[1]) / stepMm);
  if (column < 0 || row < 0 || column >= columns || row >= rows) return null;
  const cell = row * columns + column;
  return map.robot[cell] === NO_ROBOT ? null : spotOf(map, cell);
}

function spotOf({ grid, value, robot }: FloorMap, cell: number): FloorSpot {
  const row = Math.floor(cell / grid.columns);
  return {
    xMm: grid.originMm[0] + (cell - row * grid.columns) * grid.stepMm,
    yMm: grid.originMm[1] + row * grid.stepMm,
    value: value[cell],
    robot: robot[cell],
  };
}

/** What became of a cell from the left arrangement to the right one. */
export const CELL_CHANGES = ['neither', 'both', 'gained', 'lost'] as const;
export type CellChange = (typeof CELL_CHANGES)[number];

export interface FloorDifference {
  readonly grid: FloorGrid;
  /** Right less left where both reach the cell, else NaN. */
  readonly value: Float32Array;
  /** Index into CELL_CHANGES. */
  readonly change: Uint8Array;
  readonly gainedM2: number;
  readonly lostM2: number;
  /** Floor reached by both where the right one is better, and where it is worse. */
  readonly betterM2: number;
  readonly worseM2: number;
}

/**
 * Right arrangement against left one.
 * @throws RangeError where the two composites do not share grid and measure.
 */
export function floorDifference(left: FloorMap, right: FloorMap): FloorDifference {
  if (!sameGrid(left.grid, right.grid) || left.measure !== right.measure) {
    throw new RangeError('Two floor maps can only be compared on the same grid and for the same measure.');
  }
  const cells = left.value.length;
  const value = new Float32Array(cells).fill(NaN);
  const change = new Uint8Array(cells);
  let [gained, lost, better, worse] = [0, 0, 0, 0];
  for (let cell = 0; cell < cells; cell += 1) {
    const before = left.robot[cell] !== NO_ROBOT;
    const after = right.robot[cell] !== NO_ROBOT;
    if (before && after) {
      const difference = right.value[cell] - left.value[cell];
      value[cell] = difference;
      change[cell] = 1;
      if (difference > 0) better += 1;
      else if (difference < 0) worse += 1;
    } else if (after) {
      change[cell] = 2;
      gained += 1;
    } else if (before) {
      change[cell] = 3;
      lost += 1;
    }
  }
  const area = cellAreaM2(left.grid);
  return {
    grid: left.grid,
    value,
    change,
    gainedM2: gained * area,
    lostM2: lost * area,
    betterM2: better * area,
    worseM2: worse * area,
  };
}

export function sameGrid(a: FloorGrid, b: FloorGrid): boolean {
  return (
    a.originMm[0] === b.originMm[0] &&
    a.originMm[1] === b.originMm[1] &&
    a.stepMm === b.stepMm &&
    a.columns === b.columns &&
    a.rows === b.rows
  );
}
