import { makeSolver } from '../solver';
import type { Arm, MapRequest, MapTile } from '../types';
import { write } from './cell';
import { makeFullGrid } from './full-grid';
import { makeMapTile } from './tile-codec';

/** Computes rows of one map; made once, it can be called for many rows. Nothing is allocated per cell for closed-form arms. */
export interface MapComputer {
  readonly classes: readonly string[];
  tile(rowFrom: number, rowTo: number): MapTile;
}

/** How a map is computed. `auto` takes the quickest that holds; the others are there to be compared with it. */
export type MapRoute = 'auto' | 'full grid' | 'reference';

/** Throws a RangeError where the request names a branch that the arm does not have. */
export function makeMapComputer(arm: Arm, request: MapRequest, route: MapRoute = 'auto'): MapComputer {
  const solver = makeSolver(arm);
  const classes = solver.closedForm
    ? Array.from({ length: solver.closedForm.classes }, (_, code) => solver.closedForm!.nameOf(code))
    : [];
  const wanted = request.branch === 'best' ? -1 : classes.indexOf(request.branch);
  if (request.branch !== 'best' && wanted < 0) throw new RangeError(`This arm has no branch "${request.branch}".`);

  const grid = makeFullGrid(solver, request, wanted, route !== 'reference');
  const { columns } = request.grid;

  function tile(rowFrom: number, rowTo: number): MapTile {
    const out = makeMapTile(rowFrom, rowTo, columns);
    grid.start();
    for (let row = rowFrom; row < rowTo; row++)
      for (let column = 0; column < columns; column++) {
        grid.judge(column, row);
        write(out, (row - rowFrom) * columns + column, grid.cell);
      }
    return out;
  }

  return { classes, tile };
}

/** Rows `rowFrom` to `rowTo` − 1 of a map. For several tiles of one map make the computer once. */
export function computeMapTile(arm: Arm, request: MapRequest, rowFrom: number, rowTo: number): MapTile {
  return makeMapComputer(arm, request).tile(rowFrom, rowTo);
}
