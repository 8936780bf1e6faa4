import type { Chain } from '../chain';
import { invertSmall } from '../measures/small-matrix';
import type { Transform } from '../transforms';
import { axesOf, inFlange, rotationFromZero } from './axes';
import { elbowAngle, makeBranches, type Branches, type ClosedForm } from './closed-form';
import { cross, dot, length, minus, type Triple } from './lines';
import { dotOf, placeInFlange } from './vectors';
import { wrapped } from './wrapped';

const SAME = 1e-9;

/**
 * Five turning joints on four actuators: a column, three parallel axes whose turns add up to nothing, so that the flange stays level, and a turn of the
 * flange. Solved in chain joints and put into actuator values by the inverse of the coupling.
 */
export function palletiserSolver(chain: Chain): ClosedForm | null {
  if (chain.joints !== 5 || chain.actuators !== 4 || !chain.coupling || chain.prismatic.includes(1)) return null;
  if (chain.coupling.some((share) => share !== 0 && Math.abs(share) !== 1)) return null;
  const { directions: z, points: p, flange: zero } = axesOf(chain);
  const parallel = (i: number, j: number) => length(cross(z[i], z[j])) < SAME;
  if (Math.abs(dot(z[0], z[1])) > SAME || !parallel(1, 2) || !parallel(1, 3) || !parallel(0, 4)) return null;
  const sign = z.map((axis, i) => Math.sign(dot(axis, i === 0 || i === 4 ? z[0] : z[1])));
  const toActuators = inverseOf(chain);
  const tilts = Array.from({ length: 4 }, (_, k) =>
    [1, 2, 3].reduce((sum, joint) => sum + sign[joint] * chain.coupling![4 * joint + k], 0),
  );
  if (!toActuators || tilts.some((tilt) => tilt !== 0)) return null;

  // Plane of the arm at the zero posture: out from the column and up along it.
  const out = cross(z[1], z[0]);
  const inPlane = (point: Triple): Triple => {
    const from = minus(point, p[0]);
    return [dot(out, from), dot(z[1], from), dot(z[0], from)];
  };
  const [shoulder, elbow, wrist, end] = [p[1], p[2], p[3], p[4]].map(inPlane);
  const upper = Math.hypot(elbow[0] - shoulder[0], elbow[2] - shoulder[2]);
  const fore = Math.hypot(wrist[0] - elbow[0], wrist[2] - elbow[2]);
  if (upper < SAME || fore < SAME) return null;
  const upperAngle = Math.atan2(elbow[0] - shoulder[0], elbow[2] - shoulder[2]);
  const foreAngle = Math.atan2(wrist[0] - elbow[0], wrist[2] - elbow[2]);
  const lateral = end[1];
  // The flange may stand off its axis; where that axis meets the flange is the same in every posture.
  const axisInFlange = inFlange(zero, p[4]);
  const branches = makeBranches(4, 4);
  const q = new Float64Array(5);
  const at = new Float64Array(3);
  const turned = new Float64Array(9);

  function solve(flange: Transform): Branches {
    branches.count = 0;
    branches.shortfall = 'none';
    branches.by = 0;
    // relative = flange · zeroᵀ has to be a turn about the column's axis.
    rotationFromZero(flange, zero, turned);
    const yaw = turnAbout(turned, z[0], out, z[1]);
    if (Number.isNaN(yaw)) {
      branches.shortfall = 'direction';
      return branches;
    }
    placeInFlange(flange, axisInFlange, at);
    for (let row = 0; row < 3; row++) at[row] -= p[0][row];
    const x = dotOf(out, at);
    const y = dotOf(z[1], at);
    const height = dotOf(z[0], at);
    const square = x * x + y * y;
    if (square < lateral * lateral - 1e-13) {
      branches.shortfall = 'too near';
      branches.by = Math.abs(lateral) - Math.sqrt(square);
      return branches;
    }
    const radial = Math.sqrt(Math.max(0, square - lateral * lateral));
    const heading = square < 1e-20 ? 0 : Math.atan2(y, x);
    for (let side = 0; side < 2; side++) {
      const distance = side === 0 ? radial : -radial;
      solveSide(wrapped(heading - Math.atan2(lateral, distance)), distance, height, yaw, side);
    }
    return branches;
  }

  function solveSide(q1: number, distance: number, height: number, yaw: number, side: number) {
    const dx = distance - (end[0] - wrist[0]) - shoulder[0];
    const dz = height - (end[2] - wrist[2]) - shoulder[2];
    const square = dx * dx + dz * dz;
    const bend = elbowAngle(square, upper, fore);
    if (Number.isNaN(bend)) {
      const size = Math.sqrt(square);
      const far = size > upper + fore;
      const by = far ? size - upper - fore : Math.abs(upper - fore) - size;
      if (branches.count > 0 || (branches.shortfall !== 'none' && by >= branches.by)) return;
      branches.shortfall = far ? 'too far' : 'too near';
      branches.by = by;
      return;
    }
    for (let way = 0; way < 2; way++) {
      const turn = way === 0 ? bend : -bend;
      const lift = Math.atan2(dx, dz) - Math.atan2(fore * Math.sin(turn), upper + fore * Math.cos(turn)) - upperAngle;
      const fold = turn - (foreAngle - upperAngle);
      q[0] = q1;
      // Angles above run from the column's axis outward, as a turn about z[1] does.
      q[1] = lift;
      q[2] = sign[2] * fold;
      q[3] = -sign[3] * (lift + fold);
      q[4] = sign[4] * (yaw - q1);
      add((side === 0 ? 0 : 2) | ((way === 0) !== (side === 0) ? 1 : 0));
      if (bend === 0) break;
    }
  }

  function add(code: number) {
    for (let k = 0; k < 4; k++) {
      let sum = 0;
      for (let joint = 0; joint < 5; joint++) sum += toActuators![5 * k + joint] * q[joint];
      branches.values[4 * branches.count + k] = wrapped(sum);
    }
    branches.codes[branches.count++] = code;
  }

  return {
    branches,
    classes: 4,
    family: null,
    solve,
    nameOf: (code) => `shoulder ${code & 2 ? 'left' : 'right'}, elbow ${code & 1 ? 'down' : 'up'}`,
    shapeOf: (code) => code,
  };
}

/** Least-squares inverse of the coupling, actuators × joints; null where it has no full rank. */
function inverseOf(chain: Chain): number[] | null {
  const { joints, actuators, coupling } = chain;
  const column = (k: number) => Array.from({ length: joints }, (_, j) => coupling![j * actuators + k]);
  const columns = Array.from({ length: actuators }, (_, k) => column(k));
  const product = (a: number[], b: number[]) => a.reduce((sum, value, i) => sum + value * b[i], 0);
  const square = Float64Array.from(columns.flatMap((left) => columns.map((right) => product(left, right))));
  const inverse = new Float64Array(actuators * actuators);
  if (!invertSmall(square, actuators, inverse)) return null;
  return columns.flatMap((_, k) =>
    Array.from({ length: joints }, (__, j) =>
      columns.reduce((sum, values, m) => sum + inverse[k * actuators + m] * values[j], 0),
    ),
  );
}

/** Angle by which a rotation (row after row) turns about `axis`; NaN where it is not a turn about it. `x`, `y`: square to the axis and each other. */
function turnAbout(r: Float64Array, axis: Triple, x: Triple, y: Triple): number {
  let off = 0;
  let c = 0;
  let s = 0;
  for (let row = 0; row < 3; row++) {
    const up = r[3 * row] * axis[0] + r[3 * row + 1] * axis[1] + r[3 * row + 2] * axis[2];
    off += (up - axis[row]) * (up - axis[row]);
    const side = r[3 * row] * x[0] + r[3 * row + 1] * x[1] + r[3 * row + 2] * x[2];
    c += side * x[row];
    s += side * y[row];
  }
  return off > SAME * SAME ? NaN : Math.atan2(s, c);
}
