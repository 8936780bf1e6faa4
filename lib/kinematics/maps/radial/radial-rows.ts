import type { MapRequest, MapTile } from '../../types';
import { CODE, write } from '../cell';
import type { FullGrid } from '../full-grid';
import { CANNOT_TELL, makeLimitNamer } from './name-limit';
import {
  CHANGING,
  makePieces,
  REACHING,
  SHORT,
  SLOT,
  SLOT_C6,
  SLOT_CLASS,
  SLOT_FACING,
  SLOT_GUARD,
  SLOT_LINES,
  SLOT_S6,
} from './pieces';
import { makeProfile } from './profile';
import type { Symmetry } from './symmetry';

/** Cells nearer to axis 1 than this (m) have no bearing. */
const ON_AXIS = 1e-6;
/** Difference of cosines within which the limit of joint 1 is left to the single cell. */
const LIMIT_EDGE = 1e-7;

/** Fills the rows of a tile from a profile over the radius; cells where something changes are judged one by one. */
export function makeRadialRows(symmetry: Symmetry, request: MapRequest, grid: FullGrid): (out: MapTile) => void {
  const { origin, step, columns, rows } = request.grid;
  const { toPlane, halfRanges, first, lastIsFree, turn6 } = symmetry;
  const [middleC, middleS, firstEdge] = first;
  const perRange1 = 1 / (2 * halfRanges[0]);
  const perRange6 = 1 / (2 * halfRanges[5]);
  const [xByX, xByY, shiftX, yByX, yByY, shiftY] = toPlane;

  const farthest = Math.max(
    ...[0, columns - 1].flatMap((column) =>
      [0, rows - 1].map((row) => {
        const x = origin[0] + column * step;
        const y = origin[1] + row * step;
        return Math.hypot(xByX * x + xByY * y + shiftX, yByX * x + yByY * y + shiftY);
      }),
    ),
  );
  // A piece this wide holds about two cells of the map, which cost no more than halving it once more would.
  const profile = makeProfile(symmetry, farthest + step, (2 * farthest) / (columns * rows));
  const { kinds, reasons, slots, starts, ends, perBucket } = makePieces(profile, symmetry);
  const spot = new Float64Array(2);
  const nameLimit = makeLimitNamer(profile, symmetry, spot);

  function single(out: MapTile, at: number, column: number, row: number) {
    grid.judge(column, row);
    write(out, at, grid.cell);
  }

  function beyondLimits(out: MapTile, at: number, piece: number, column: number, row: number) {
    const joint = nameLimit(piece);
    if (joint === CANNOT_TELL) return single(out, at, column, row);
    out.reason[at] = CODE['joint limit'];
    out.bindingJoint[at] = joint;
  }

  return (out) => {
    grid.start();
    const { reason, branch, inverseConditionNumber, maximumToolSpeed, sureSpeed, limitShare } = out;
    let at = 0;
    for (let row = out.rowFrom; row < out.rowTo; row++) {
      const rowY = origin[1] + row * step;
      const fromX = xByY * rowY + shiftX;
      const fromY = yByY * rowY + shiftY;
      for (let column = 0; column < columns; column++, at++) {
        const columnX = origin[0] + column * step;
        const x = fromX + xByX * columnX;
        const y = fromY + yByX * columnX;
        const square = x * x + y * y;
        let piece = starts[(square * perBucket) | 0];
        while (ends[piece] <= square) piece++;
        const kind = kinds[piece];
        if (kind === SHORT) {
          reason[at] = reasons[piece];
          continue;
        }
        if (kind === CHANGING || square < ON_AXIS * ON_AXIS) {
          single(out, at, column, row);
          continue;
        }
        spot[0] = x;
        spot[1] = y;
        // Bearing from the middle of joint 1's range, times the radius.
        const radius = Math.sqrt(square);
        const ahead = x * middleC + y * middleS;
        const edge = radius * firstEdge;
        const doubt = radius * LIMIT_EDGE;
        let slot = 2 * SLOT * piece;
        let beyond = kind === REACHING ? slots[slot + SLOT_FACING] * ahead - edge : -1;
        if (beyond < -doubt) {
          slot += SLOT;
          if (slots[slot + SLOT_FACING] === 0) {
            beyondLimits(out, at, piece, column, row);
            continue;
          }
          beyond = slots[slot + SLOT_FACING] * ahead - edge;
          if (beyond < -doubt) {
            beyondLimits(out, at, piece, column, row);
            continue;
          }
        }
        if (beyond <= doubt) {
          single(out, at, column, row);
          continue;
        }
        const line = slot + SLOT_LINES;
        let share = slots[line + 6] + slots[line + 7] * square;
        const facing = slots[slot + SLOT_FACING] * ahead;
        if (facing < radius * slots[slot + SLOT_GUARD])
          share = Math.min(share, 0.5 - perRange1 * Math.atan2(Math.abs(y * middleC - x * middleS), facing));
        if (!lastIsFree) {
          const c6 = slots[slot + SLOT_C6];
          const s6 = slots[slot + SLOT_S6];
          const off6 = Math.atan2(Math.abs(s6 * x + turn6 * c6 * y), c6 * x - turn6 * s6 * y);
          share = Math.min(share, 0.5 - perRange6 * off6);
        }
        branch[at] = slots[slot + SLOT_CLASS];
        inverseConditionNumber[at] = slots[line] + slots[line + 1] * square;
        maximumToolSpeed[at] = slots[line + 2] + slots[line + 3] * square;
        sureSpeed[at] = slots[line + 4] + slots[line + 5] * square;
        limitShare[at] = Math.max(0, share);
      }
    }
  };
}
