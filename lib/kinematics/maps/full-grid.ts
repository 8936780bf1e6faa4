import { makeGauge } from '../measures/gauge';
import type { Solver } from '../solver';
import { orient } from '../target';
import { identityTransform, type Transform } from '../transforms';
import type { MapRequest, Vec3 } from '../types';
import { CODE, emptyCell, resetCell, type Cell } from './cell';
import { makeConeSweep } from './cone-sweep';
import { makeFamilyJudge } from './family-judge';
import { makeNumericalJudge, makeReferenceJudge } from './reference-judge';
import { makeRollSearch, type Judge } from './roll-search';
import { makeSixAxisJudge } from './six-axis-judge';

const DOWN: Vec3 = [0, 0, -1];

/** Judges single cells of a map, each by itself: the route that works for every map. */
export interface FullGrid {
  readonly cell: Cell;
  /** Call before the first of a run of cells. */
  start(): void;
  /** Judges the cell whose centre is at column and row (any numbers, whole or not) into `cell`. */
  judge(column: number, row: number): void;
}

/** `wanted`: class of branch, −1 for the best. `quick`: take the six-axis path where the arm has one; the general one gives the same. */
export function makeFullGrid(solver: Solver, request: MapRequest, wanted: number, quick: boolean): FullGrid {
  const pose = identityTransform();
  const cell = emptyCell();
  const { origin, step } = request.grid;
  const { direction, toolHeight } = request;
  const freeRoll = request.roll === 'free';
  const roll = request.roll === 'free' ? 0 : request.roll;
  const lastIsFree = freeRoll && solver.toolOnLastAxis;
  const searches = freeRoll && solver.closedForm !== null && !lastIsFree;
  const outward = direction.kind === 'outward';
  const { cone } = request;
  const gauge = makeGauge(solver.chain, solver.freedoms, request.wrist);
  const general = !solver.closedForm
    ? makeNumericalJudge(solver, gauge, freeRoll, cell)
    : solver.closedForm.family
      ? makeFamilyJudge(solver, gauge, wanted, lastIsFree, searches, cell)
      : makeReferenceJudge(solver, gauge, wanted, lastIsFree, cell);
  const six =
    quick && solver.method === 'spherical wrist' && solver.freedoms.length === 6
      ? makeSixAxisJudge(
          solver.chain,
          request.wrist,
          wanted,
          lastIsFree,
          outward || searches || cone !== undefined,
          searches,
          cell,
        )
      : null;

  const visitBy = (judge: Judge): (() => boolean) => (searches ? makeRollSearch(pose, cell, judge) : () => judge(pose));
  const visitGeneral = visitBy(general);
  const visitQuick = six ? visitBy(six.judge) : null;
  const baseX = solver.chain.base[3];
  const baseY = solver.chain.base[7];

  function visit() {
    resetCell(cell);
    if (visitQuick) {
      if (visitQuick()) return;
      resetCell(cell);
    }
    visitGeneral();
  }

  const upright = request.section !== undefined;
  const alongX = step * Math.cos(request.section?.bearing ?? 0);
  const alongY = step * Math.sin(request.section?.bearing ?? 0);
  const sweep = cone ? makeConeSweep(cone, roll, pose, cell, visit) : null;

  return {
    cell,
    start() {
      if (direction.kind === 'outward') return;
      orient(direction.kind === 'vector' ? direction.vector : DOWN, roll, pose);
      if (six) six.orient(pose);
    },
    judge(column, row) {
      pose[3] = origin[0] + column * alongX;
      pose[7] = origin[1] + (upright ? column * alongY : row * step);
      pose[11] = upright ? toolHeight + row * step : toolHeight;
      if (direction.kind === 'outward') orientOutward(pose, baseX, baseY, direction.tilt, roll);
      if (sweep) return sweep();
      visit();
      cell.coverage = cell.reason === CODE.reached ? 1 : 0;
    },
  };
}

function orientOutward(pose: Transform, baseX: number, baseY: number, tilt: number, roll: number) {
  const x = pose[3] - baseX;
  const y = pose[7] - baseY;
  const radius = Math.hypot(x, y);
  // Right above the base there is no outward; its x axis stands in.
  const c = Math.cos(tilt) / (radius || 1);
  orient([radius ? x * c : Math.cos(tilt), y * c, Math.sin(tilt)], roll, pose);
}
