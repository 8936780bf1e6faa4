import type { MapTile } from '@/lib/kinematics/types';
import type { Placement } from './geometry';
import type { MapMeasure } from './map-settings';

/**
 * Maps of several robots, laid out on the floor as one. Each robot's map belongs to its base frame and never changes while
 * the robot is dragged; what changes is this composite, so it is made anew on every pointer move: typed arrays only,
 * nothing allocated when the last result is handed back in.
 */

/** Cells whose sides run along the floor's axes. `originMm` is the centre of the first cell; rows run away from the reader. */
export interface FloorGrid {
  readonly originMm: readonly [number, number];
  readonly stepMm: number;
  readonly columns: number;
  readonly rows: number;
}

/** One robot's finished map and where its base stands. */
export interface PlacedMap {
  readonly robotId: string;
  readonly placement: Placement;
  /** Of the map, in the base frame. */
  readonly grid: FloorGrid;
  /** The whole map: all rows of `grid`. */
  readonly tile: MapTile;
}

/** Marks a cell that no robot reaches. */
export const NO_ROBOT = 255;

export interface FloorMap {
  readonly grid: FloorGrid;
  readonly measure: MapMeasure;
  /** Best value a cell, NaN where no robot reaches it; for `reach` 1 where one does. */
  readonly value: Float32Array;
  /** Index of the robot with that value among the maps given, else NO_ROBOT. */
  readonly robot: Uint8Array;
  /** That robot's class of branch there, a number of its own arm. */
  readonly branch: Uint8Array;
  /** How many robots reach the cell. */
  readonly reachedBy: Uint8Array;
}

/**
 * The smallest floor grid that covers every map. Cell centres lie on whole multiples of the step, so two composites with
 * the same step always have their cells one above the other. Null where there is nothing to cover.
 */
export function floorGridOf(maps: readonly PlacedMap[], stepMm: number): FloorGrid | null {
  if (maps.length === 0) return null;
  let [left, bottom, right, top] = [Infinity, Infinity, -Infinity, -Infinity];
  for (const { placement, grid } of maps) {
    const angle = (placement.angleDeg * Math.PI) / 180;
    const [cosine, sine] = [Math.cos(angle), Math.sin(angle)];
    const width = ((grid.columns - 1) * grid.stepMm) / 2;
    const depth = ((grid.rows - 1) * grid.stepMm) / 2;
    const [middleX, middleY] = [grid.originMm[0] + width, grid.originMm[1] + depth];
    const x = placement.xMm + cosine * middleX - sine * middleY;
    const y = placement.yMm + sine * middleX + cosine * middleY;
    const reachX = Math.abs(cosine) * width + Math.abs(sine) * depth + grid.stepMm / 2;
    const reachY = Math.abs(sine) * width + Math.abs(cosine) * depth + grid.stepMm / 2;
    left = Math.min(left, x - reachX);
    right = Math.max(right, x + reachX);
    bottom = Math.min(bottom, y - reachY);
    top = Math.max(top, y + reachY);
  }
  const firstColumn = Math.floor(left / stepMm);
  const firstRow = Math.floor(bottom / stepMm);
  return {
    originMm: [firstColumn * stepMm, firstRow * stepMm],
    stepMm,
    columns: Math.ceil(right / stepMm) - firstColumn + 1,
    rows: Math.ceil(top / stepMm) - firstRow + 1,
  };
}

/** A composite to fill; `like` is used again where it fits. */
function blankFloorMap(grid: FloorGrid, measure: MapMeasure, like?: FloorMap): FloorMap {
  const cells = grid.columns * grid.rows;
  const fits = like !== undefined && like.value.length === cells;
  return {
    grid,
    measure,
    value: (fits ? like.value : new Float32Array(cells)).fill(NaN),
    robot: (fits ? like.robot : new Uint8Array(cells)).fill(NO_ROBOT),
    branch: (fits ? like.branch : new Uint8Array(cells)).fill(0),
    reachedBy: (fits ? like.reachedBy : new Uint8Array(cells)).fill(0),
  };
}

/**
 * The best robot and its value, cell by cell. Each floor cell takes the nearest cell of a robot's map: values jump where the
 * best branch changes, and a blend would hide that. On a tie the earlier robot stays.
 *
 * @param reuse a composite no longer needed; its arrays are written over.
 */
export function composeFloorMap(
  grid: FloorGrid,
  maps: readonly PlacedMap[],
  measure: MapMeasure,
  reuse?: FloorMap,
): FloorMap {
  const target = blankFloorMap(grid, measure, reuse);
  maps.forEach((map, index) => addRobot(target, map, index));
  return target;
}

function addRobot(target: FloorMap, map: PlacedMap, index: number): void {
  const { grid: floor, measure, value, robot, branch, reachedBy } = target;
  const { grid, placement, tile } = map;
  const source = measure === 'reach' ? null : tile[measure];
  const reason = tile.reason;
  // The share of a cone is told wherever any of it is reached.
  const partly = measure === 'wristCoverage' ? tile.wristCoverage : null;
  const angle = (placement.angleDeg * Math.PI) / 180;
  const [cosine, sine] = [Math.cos(angle), Math.sin(angle)];
  const inverseStep = 1 / grid.stepMm;
  const stepColumn = floor.stepMm * cosine * inverseStep;
  const stepRow = -floor.stepMm * sine * inverseStep;

  for (let row = 0; row < floor.rows; row += 1) {
    const dx = floor.originMm[0] - placement.xMm;
    const dy = floor.originMm[1] + row * floor.stepMm - placement.yMm;
    // Half a cell is added so that cutting off the fraction finds the nearest centre.
    const startColumn = (cosine * dx + sine * dy - grid.originMm[0]) * inverseStep + 0.5;
    const startRow = (-sine * dx + cosine * dy - grid.originMm[1]) * inverseStep + 0.5;
    const [from, to] = overlap(startColumn, stepColumn, grid.columns, startRow, stepRow, grid.rows, floor.columns);
    let cell = row * floor.columns + from;
    for (let column = from; column < to; column += 1, cell += 1) {
      const mapColumn = Math.floor(startColumn + column * stepColumn);
      const mapRow = Math.floor(startRow + column * stepRow);
      if (mapColumn < 0 || mapRow < 0 || mapColumn >= grid.columns || mapRow >= grid.rows) continue;
      const spot = mapRow * grid.columns + mapColumn;
      if (partly ? partly[spot] === 0 : reason[spot] !== 0) continue;
      reachedBy[cell] += 1;
      const here = source === null ? 1 : source[spot];
      // Written so that NaN, the mark of a cell without a value yet, gives way, and a value that does not exist never counts.
      if (!(here <= value[cell]) && !Number.isNaN(here)) {
        value[cell] = here;
        robot[cell] = index;
        branch[cell] = tile.branch[spot];
      }
    }
  }
}

/** The stretch of a floor row, as columns from … to − 1, that can lie on the map; one cell of slack at either end. */
function overlap(
  startColumn: number,
  stepColumn: number,
  columns: number,
  startRow: number,
  stepRow: number,
  rows: number,
  length: number,
): [number, number] {
  let [from, to] = [0, length];
  for (const [start, step, size] of [
    [startColumn, stepColumn, columns],
    [startRow, stepRow, rows],
  ]) {
    if (Math.abs(step) < 1e-9) {
      if (start < 0 || start >= size) return [0, 0];
      continue;
    }
    const [enter, leave] = [-start / step, (size - start) / step];
    from = Math.max(from, Math.floor(Math.min(enter, leave)) - 1);
    to = Math.min(to, Math.ceil(Math.max(enter, leave)) + 2);
  }
  return [from, Math.max(from, to)];
}
