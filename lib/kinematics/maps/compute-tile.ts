import { makeSolver, type Solver } from '../solver';
import type { Arm, MapRequest, MapTile } from '../types';
import { write } from './cell';
import { makeFullGrid } from './full-grid';
import { makeRadialRows } from './radial/radial-rows';
import { symmetryOf } from './radial/symmetry';
import { makeMapTile } from './tile-codec';

/** Computes rows of one map; made once, it can be called for many rows. Nothing is allocated per cell for closed-form arms. */
export interface MapComputer {
  readonly classes: readonly string[];
  tile(rowFrom: number, rowTo: number): MapTile;
}

/** How a map is computed. `auto` takes the quickest that holds; the others are there to be compared with it. */
export type MapRoute = 'auto' | 'symmetry' | 'full grid' | 'reference';

/** Cells from which on a radial profile costs less than judging each cell. */
const SYMMETRY_PAYS = 2000;

/** Names of the classes of branch that maps of an arm can be asked for; none where it has no closed form. */
export function branchNames(arm: Arm): string[] {
  return namesOf(makeSolver(arm));
}

const namesOf = ({ closedForm }: Solver): string[] =>
  closedForm ? Array.from({ length: closedForm.classes }, (_, code) => closedForm.nameOf(code)) : [];

/** Throws a RangeError where the request names a branch that the arm does not have, or a cone that is none. */
export function makeMapComputer(arm: Arm, request: MapRequest, route: MapRoute = 'auto'): MapComputer {
  const solver = makeSolver(arm);
  const classes = namesOf(solver);
  const wanted = request.branch === 'best' ? -1 : classes.indexOf(request.branch);
  if (request.branch !== 'best' && wanted < 0) throw new RangeError(`This arm has no branch "${request.branch}".`);

  const grid = makeFullGrid(solver, request, wanted, route !== 'reference');
  const { columns, rows } = request.grid;

  const bySymmetry = route === 'symmetry' || (route === 'auto' && columns * rows >= SYMMETRY_PAYS);
  const symmetry = bySymmetry ? symmetryOf(solver, request, wanted) : null;
  /** Made with the first tile, since some callers only want the classes. */
  let fill: ((out: MapTile) => void) | null = null;

  function tile(rowFrom: number, rowTo: number): MapTile {
    const out = makeMapTile(rowFrom, rowTo, columns);
    if (symmetry) {
      fill ??= makeRadialRows(symmetry, request, grid);
      fill(out);
      for (let i = 0; i < out.reason.length; i++) out.wristCoverage[i] = out.reason[i] === 0 ? 1 : 0;
      return out;
    }
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
