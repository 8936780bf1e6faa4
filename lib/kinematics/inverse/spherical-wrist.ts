import { forward, makeStance, type Chain } from '../chain';
import { identityTransform, type Transform } from '../transforms';
import { elbowAngle, makeBranches, type Branches, type ClosedForm } from './closed-form';
import { along, cross, distanceToLine, dot, length, minus, nearestOnFirst, type Triple } from './lines';
import { wrapped } from './wrapped';

/**
 * Six turning joints with a spherical wrist on an ortho-parallel base (axis 2 at right angles to axis 1, axis 3 parallel to axis
 * 2), shoulder, elbow and lateral offsets included, after Pieper 1968 and Brandstötter et al. 2014. Worked from the axes at the
 * zero posture, so both Denavit-Hartenberg conventions and any angle offsets come to the same.
 */

/** Lengths (m) and cosines below which two lines count as meeting, parallel or at right angles. */
const SAME = 1e-9;
/** Sine of the wrist angle below which axes 4 and 6 count as one line: joint 4 is pinned and only the sum solved. */
const WRIST_ALIGNED = 1e-10;
/** Distance of the wrist centre from axis 1 (m) at which joint 1 is undefined: it is put at zero. */
const ON_FIRST_AXIS = 1e-10;

export const SHOULDER_LEFT = 1;
export const ELBOW_DOWN = 2;
export const WRIST_FLIPPED = 4;

export interface Geometry {
  /** Rows: the frame of axis 1 (x, y along axis 2, z along axis 1) in the base frame. */
  readonly frame: Triple[];
  readonly origin: Triple;
  /** Axis 2 in that frame's x–z plane, link lengths and their angles from z towards x at the zero posture. */
  readonly shoulderX: number;
  readonly shoulderZ: number;
  readonly lateral: number;
  readonly upper: number;
  readonly fore: number;
  readonly upperAngle: number;
  readonly foreAngle: number;
  /** ±1: joint 3 turns with or against joint 2. */
  readonly turn3: number;
  /** Wrist centre in the flange frame. */
  readonly wristInFlange: Triple;
  /** Wrist basis in the frame of axis 1, and the constant right factor: both 3 × 3, row after row. */
  readonly wristBasis: Float64Array;
  readonly flangeToWrist: Float64Array;
  readonly wristZero: number;
}

/** The solver, or null where the chain is not of this kind. */
export function sphericalWristSolver(chain: Chain): ClosedForm | null {
  const found = recognise(chain);
  return found ? makeSolver(found) : null;
}

export function recognise(chain: Chain): Geometry | null {
  if (chain.joints !== 6 || chain.coupling || chain.prismatic.some((flag) => flag === 1)) return null;
  const unbased: Chain = { ...chain, base: identityTransform() };
  const stance = forward(unbased, new Float64Array(6), makeStance(unbased));
  const axis = (i: number): Triple => [stance.axes[3 * i], stance.axes[3 * i + 1], stance.axes[3 * i + 2]];
  const point = (i: number): Triple => [stance.origins[3 * i], stance.origins[3 * i + 1], stance.origins[3 * i + 2]];
  const z = [0, 1, 2, 3, 4, 5].map(axis);
  const p = [0, 1, 2, 3, 4, 5].map(point);
  if (Math.abs(dot(z[0], z[1])) > SAME || length(cross(z[1], z[2])) > SAME) return null;
  if (Math.abs(dot(z[3], z[4])) > SAME || Math.abs(dot(z[4], z[5])) > SAME) return null;
  const centre = nearestOnFirst(p[3], z[3], p[4], z[4]);
  if (!centre || distanceToLine(centre, p[4], z[4]) > SAME || distanceToLine(centre, p[5], z[5]) > SAME) return null;

  const frame: Triple[] = [cross(z[1], z[0]), z[1], z[0]];
  const inFrame = (vector: Triple): Triple => [dot(frame[0], vector), dot(frame[1], vector), dot(frame[2], vector)];
  const shoulder = inFrame(minus(p[1], p[0]));
  const elbow = inFrame(minus(p[2], p[0]));
  const wrist = inFrame(minus(centre, p[0]));
  const upper = Math.hypot(elbow[0] - shoulder[0], elbow[2] - shoulder[2]);
  const fore = Math.hypot(wrist[0] - elbow[0], wrist[2] - elbow[2]);
  if (upper < SAME || fore < SAME) return null;

  const flange = stance.flange;
  const basis: Triple[] = [cross(z[4], z[3]), z[4], z[3]];
  const wristZero = Math.atan2(dot(z[5], basis[0]), dot(z[5], z[3]));
  const fromFlange = minus(centre, [flange[3], flange[7], flange[11]]);
  const column = (c: number): Triple => [flange[c], flange[4 + c], flange[8 + c]];
  // flangeᵀ · basis · Ry(wristZero): column x of Ry is (cos, 0, −sin), column z is (sin, 0, cos).
  const c = Math.cos(wristZero);
  const s = Math.sin(wristZero);
  const zero: Triple = [0, 0, 0];
  const turnedBasis = [
    along(along(zero, basis[0], c), basis[2], -s),
    basis[1],
    along(along(zero, basis[0], s), basis[2], c),
  ];
  return {
    frame,
    origin: p[0],
    shoulderX: shoulder[0],
    shoulderZ: shoulder[2],
    lateral: wrist[1],
    upper,
    fore,
    upperAngle: Math.atan2(elbow[0] - shoulder[0], elbow[2] - shoulder[2]),
    foreAngle: Math.atan2(wrist[0] - elbow[0], wrist[2] - elbow[2]),
    turn3: dot(z[1], z[2]) > 0 ? 1 : -1,
    wristInFlange: [dot(column(0), fromFlange), dot(column(1), fromFlange), dot(column(2), fromFlange)],
    wristBasis: Float64Array.from([0, 1, 2].flatMap((row) => basis.map((vector) => dot(frame[row], vector)))),
    flangeToWrist: Float64Array.from([0, 1, 2].flatMap((row) => turnedBasis.map((vector) => dot(column(row), vector)))),
    wristZero,
  };
}

function makeSolver(g: Geometry): ClosedForm {
  const branches = makeBranches(8, 6);
  const { values, codes } = branches;
  const [fx, fy, fz] = g.frame;
  const rotated = new Float64Array(9);
  const wrist = new Float64Array(9);
  const reachFar = g.upper + g.fore;
  const reachNear = Math.abs(g.upper - g.fore);

  function solve(flange: Transform): Branches {
    branches.count = 0;
    branches.shortfall = 'none';
    branches.by = 0;
    const [wx, wy, wz] = g.wristInFlange;
    const px = flange[0] * wx + flange[1] * wy + flange[2] * wz + flange[3] - g.origin[0];
    const py = flange[4] * wx + flange[5] * wy + flange[6] * wz + flange[7] - g.origin[1];
    const pz = flange[8] * wx + flange[9] * wy + flange[10] * wz + flange[11] - g.origin[2];
    const cx = fx[0] * px + fx[1] * py + fx[2] * pz;
    const cy = fy[0] * px + fy[1] * py + fy[2] * pz;
    const cz = fz[0] * px + fz[1] * py + fz[2] * pz;
    const square = cx * cx + cy * cy;
    const outside = square - g.lateral * g.lateral;
    if (outside < -1e-13) {
      branches.shortfall = 'too near';
      branches.by = Math.abs(g.lateral) - Math.sqrt(square);
      return branches;
    }
    const radial = Math.sqrt(Math.max(0, outside));
    turnFlange(flange);
    const heading = square < ON_FIRST_AXIS * ON_FIRST_AXIS ? 0 : Math.atan2(cy, cx);
    for (let side = 0; side < 2; side++) {
      const x = side === 0 ? radial : -radial;
      solveSide(wrapped(heading - Math.atan2(g.lateral, x)), x, cz, side);
    }
    return branches;
  }

  function solveSide(q1: number, x: number, z: number, side: number) {
    const dx = x - g.shoulderX;
    const dz = z - g.shoulderZ;
    const square = dx * dx + dz * dz;
    const elbow = elbowAngle(square, g.upper, g.fore);
    if (Number.isNaN(elbow)) {
      noteShortfall(Math.sqrt(square));
      return;
    }
    const heading = Math.atan2(dx, dz);
    for (let way = 0; way < 2; way++) {
      const bend = way === 0 ? elbow : -elbow;
      const upperTurn = heading - Math.atan2(g.fore * Math.sin(bend), g.upper + g.fore * Math.cos(bend)) - g.upperAngle;
      const foreTurn = bend - (g.foreAngle - g.upperAngle);
      // Bending forward lifts the elbow of an arm that faces the spot, and drops it where the arm reaches over its back.
      const down = (way === 0) !== (side === 0);
      const code = (side === 0 ? 0 : SHOULDER_LEFT) | (down ? ELBOW_DOWN : 0);
      solveWrist(q1, upperTurn, foreTurn, code);
      if (elbow === 0) break;
    }
  }

  function noteShortfall(distance: number) {
    const far = distance > reachFar;
    const by = far ? distance - reachFar : reachNear - distance;
    // The side that misses by less is the one to tell.
    if (branches.count > 0 || (branches.shortfall !== 'none' && by >= branches.by)) return;
    branches.shortfall = far ? 'too far' : 'too near';
    branches.by = by;
  }

  /** frame · flange rotation · constant, the part of the wrist that no joint changes. */
  function turnFlange(flange: Transform) {
    const k = g.flangeToWrist;
    for (let row = 0; row < 3; row++) {
      const f = g.frame[row];
      const a = f[0] * flange[0] + f[1] * flange[4] + f[2] * flange[8];
      const b = f[0] * flange[1] + f[1] * flange[5] + f[2] * flange[9];
      const c = f[0] * flange[2] + f[1] * flange[6] + f[2] * flange[10];
      for (let column = 0; column < 3; column++)
        rotated[3 * row + column] = a * k[column] + b * k[3 + column] + c * k[6 + column];
    }
  }

  function solveWrist(q1: number, upperTurn: number, foreTurn: number, code: number) {
    unturn(q1, upperTurn + foreTurn);
    const sine = Math.hypot(wrist[2], wrist[5]);
    const q2 = wrapped(upperTurn);
    const q3 = wrapped(g.turn3 * foreTurn);
    if (sine < WRIST_ALIGNED) {
      // Joints 4 and 6 turn about one line: only their sum (or difference) is given, and the posture counts once.
      const straight = wrist[8] > 0;
      const sum = straight ? Math.atan2(wrist[3], wrist[0]) : Math.atan2(wrist[3], -wrist[0]);
      add(q1, q2, q3, 0, (straight ? 0 : Math.PI) - g.wristZero, sum, code);
      return;
    }
    const bend = Math.atan2(sine, wrist[8]);
    for (let flip = 0; flip < 2; flip++) {
      const roll = flip === 0 ? Math.atan2(wrist[5], wrist[2]) : Math.atan2(-wrist[5], -wrist[2]);
      const c = Math.cos(roll);
      const s = Math.sin(roll);
      // Taken from what joint 4 leaves over, so that near the aligned wrist the errors of both cancel.
      const last = Math.atan2(c * wrist[3] - s * wrist[0], c * wrist[4] - s * wrist[1]);
      const q5 = (flip === 0 ? bend : -bend) - g.wristZero;
      add(q1, q2, q3, roll, q5, last, code | (flip === 0 ? 0 : WRIST_FLIPPED));
    }
  }

  /** wrist = wristBasisᵀ · Ry(−lean) · Rz(−q1) · rotated */
  function unturn(q1: number, lean: number) {
    const c1 = Math.cos(q1);
    const s1 = Math.sin(q1);
    const cl = Math.cos(lean);
    const sl = Math.sin(lean);
    const w = g.wristBasis;
    for (let column = 0; column < 3; column++) {
      const x = c1 * rotated[column] + s1 * rotated[3 + column];
      const y = c1 * rotated[3 + column] - s1 * rotated[column];
      const z = rotated[6 + column];
      const lx = cl * x - sl * z;
      const lz = sl * x + cl * z;
      for (let row = 0; row < 3; row++) wrist[3 * row + column] = w[row] * lx + w[3 + row] * y + w[6 + row] * lz;
    }
  }

  function add(q1: number, q2: number, q3: number, q4: number, q5: number, q6: number, code: number) {
    const at = 6 * branches.count;
    values[at] = q1;
    values[at + 1] = q2;
    values[at + 2] = q3;
    values[at + 3] = wrapped(q4);
    values[at + 4] = wrapped(q5);
    values[at + 5] = wrapped(q6);
    codes[branches.count++] = code;
  }

  return { branches, classes: 8, family: null, solve, nameOf, shapeOf: (code) => code & ~WRIST_FLIPPED };
}

function nameOf(code: number): string {
  const shoulder = code & SHOULDER_LEFT ? 'shoulder left' : 'shoulder right';
  const elbow = code & ELBOW_DOWN ? 'elbow down' : 'elbow up';
  const wrist = code & WRIST_FLIPPED ? 'wrist flipped' : 'wrist plain';
  return `${shoulder}, ${elbow}, ${wrist}`;
}
