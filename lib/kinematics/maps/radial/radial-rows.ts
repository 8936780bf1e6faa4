import type { MapRequest, MapTile } from '../../types';
import { CODE, write } from '../cell';
import type { FullGrid } from '../full-grid';
import {
  ABSENT,
  C6,
  CLASS,
  FACING,
  FIRST,
  INSIDE,
  KNOT,
  MAXIMUM,
  MISS,
  REASON,
  REST,
  S6,
  SIDE,
  SQUARE,
  STATUS,
  SURE,
  VALUE,
} from './knot';
import { makeProfile, type Profile } from './profile';
import type { Symmetry } from './symmetry';

/** Cells nearer to axis 1 than this (m) have no bearing. */
const ON_AXIS = 1e-6;
/** Difference of cosines within which the limit of joint 1 is left to the single cell. */
const LIMIT_EDGE = 1e-7;
/** Two joints or sides that miss by less than this apart (rad): which one to name is left to the single cell. */
const TIE = 3e-3;
/** Squared radii are looked up in even buckets, several a piece. */
const BUCKETS = 2048;

/** Fills the rows of a tile from a profile over the radius; cells where something changes are judged one by one. */
export function makeRadialRows(symmetry: Symmetry, request: MapRequest, grid: FullGrid) {
  const { origin, step, columns, rows } = request.grid;
  const { toPlane, halfRanges, first, lastIsFree, turn6 } = symmetry;
  const [firstC, firstS, firstEdge] = first;
  const [half1, half6] = [halfRanges[0], halfRanges[5]];
  const perRange1 = 1 / (2 * half1);
  const perRange6 = 1 / (2 * half6);
  const placeX = (column: number, row: number) =>
    toPlane[0] * (origin[0] + column * step) + toPlane[1] * (origin[1] + row * step) + toPlane[2];
  const placeY = (column: number, row: number) =>
    toPlane[3] * (origin[0] + column * step) + toPlane[4] * (origin[1] + row * step) + toPlane[5];
  const corners = [0, columns - 1].flatMap((c) => [0, rows - 1].map((r) => Math.hypot(placeX(c, r), placeY(c, r))));
  const farthest = Math.max(...corners) + step;
  // A piece this wide holds about two cells of the map, no more than finding its change would cost.
  const { knots, pieces, changes }: Profile = makeProfile(symmetry, farthest, (2 * farthest) / (columns * rows));
  const outermost = knots[pieces * KNOT + SQUARE];
  const perBucket = BUCKETS / outermost;
  const bucketStart = new Uint16Array(BUCKETS + 1);
  for (let bucket = 0, piece = 0; bucket <= BUCKETS; bucket++) {
    while (piece < pieces - 1 && knots[(piece + 1) * KNOT + SQUARE] * perBucket <= bucket) piece++;
    bucketStart[bucket] = piece;
  }

  function single(out: MapTile, at: number, column: number, row: number) {
    grid.judge(column, row);
    write(out, at, grid.cell);
  }

  return (out: MapTile) => {
    grid.start();
    const { reason, bindingJoint, branch, inverseConditionNumber, maximumToolSpeed, sureSpeed, limitShare } = out;
    for (let row = out.rowFrom; row < out.rowTo; row++)
      for (let column = 0; column < columns; column++) {
        const at = (row - out.rowFrom) * columns + column;
        const x = placeX(column, row);
        const y = placeY(column, row);
        const square = x * x + y * y;
        let piece = bucketStart[(square * perBucket) | 0];
        while (knots[(piece + 1) * KNOT + SQUARE] <= square) piece++;
        if (changes[piece] === 1 || square < ON_AXIS * ON_AXIS) {
          single(out, at, column, row);
          continue;
        }
        const knot = piece * KNOT;
        const next = knot + KNOT;
        const radius = Math.sqrt(square);
        const t = (square - knots[knot + SQUARE]) / (knots[next + SQUARE] - knots[knot + SQUARE]);
        // Bearing from the middle of joint 1's range, times the radius.
        const ahead = x * firstC + y * firstS;
        const edge = radius * firstEdge;
        const doubt = radius * LIMIT_EDGE;
        let side = knots[knot + FIRST] === 0 ? knot : knot + SIDE;
        let state = 0;
        for (let turn = 0; turn < 2; turn++) {
          if (turn === 1) side = side === knot ? knot + SIDE : knot;
          if (knots[side + STATUS] !== INSIDE) continue;
          const beyond = knots[side + FACING] * ahead - edge;
          if (beyond > doubt) {
            state = 1;
            break;
          }
          if (beyond > -doubt) {
            state = 2;
            break;
          }
        }
        if (state === 1) {
          const far = side + KNOT;
          const facing = knots[side + FACING];
          let share = knots[side + REST] + t * (knots[far + REST] - knots[side + REST]);
          const off1 = Math.atan2(Math.abs(y * firstC - x * firstS), facing * ahead);
          share = Math.min(share, 0.5 - off1 * perRange1);
          if (!lastIsFree) {
            const c6 = knots[side + C6];
            const s6 = knots[side + S6];
            const off6 = Math.atan2(Math.abs(s6 * x + turn6 * c6 * y), c6 * x - turn6 * s6 * y);
            share = Math.min(share, 0.5 - off6 * perRange6);
          }
          reason[at] = 0;
          bindingJoint[at] = 0;
          branch[at] = knots[side + CLASS];
          inverseConditionNumber[at] = knots[side + VALUE] + t * (knots[far + VALUE] - knots[side + VALUE]);
          maximumToolSpeed[at] = knots[side + MAXIMUM] + t * (knots[far + MAXIMUM] - knots[side + MAXIMUM]);
          sureSpeed[at] = knots[side + SURE] + t * (knots[far + SURE] - knots[side + SURE]);
          limitShare[at] = Math.max(0, share);
        } else if (state === 2) single(out, at, column, row);
        else {
          const left = knots[knot + STATUS];
          const right = knots[knot + SIDE + STATUS];
          if (left === ABSENT && right === ABSENT) {
            reason[at] = knots[knot + REASON];
            continue;
          }
          const aside = Math.abs(y * firstC - x * firstS);
          let joint = 0;
          let least = Infinity;
          for (let s = knot; s <= knot + SIDE; s += SIDE) {
            if (knots[s + STATUS] === ABSENT) continue;
            const rest = knots[s + MISS] + t * (knots[s + KNOT + MISS] - knots[s + MISS]);
            const miss1 = firstEdge === -2 ? 0 : Math.max(0, Math.atan2(aside, knots[s + FACING] * ahead) - half1);
            const by = Math.max(rest, miss1);
            const named = miss1 >= rest ? 1 : knots[s + CLASS];
            // Too close to tell, unless both would name the same joint.
            if (Math.abs(miss1 - rest) < TIE || (named !== joint && Math.abs(by - least) < TIE)) joint = -1;
            if (joint === -1) break;
            if (by < least) {
              least = by;
              joint = named;
            }
          }
          if (joint === -1) single(out, at, column, row);
          else {
            reason[at] = CODE['joint limit'];
            bindingJoint[at] = joint;
          }
        }
      }
  };
}
