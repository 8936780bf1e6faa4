import type { Chain } from '../chain';
import type { Transform } from '../transforms';
import { axesOf, inFlange, meetingPoint, rotationFromZero } from './axes';
import { elbowAngle, makeBranches, type Branches, type ClosedForm } from './closed-form';
import { along, cross as crossOf, dot, length, minus, type Triple } from './lines';
import { makeThreeTurns } from './three-turns';
import { addScaled, cross, dotOf, placeInFlange, toUnit, turn, type Vector } from './vectors';
import { wrapped } from './wrapped';

const SAME = 1e-9;
/** Evenly round the line from shoulder to wrist: finds ranges from 15° on, narrower ones by refining. */
const SAMPLES = 24;

export const SHOULDER_FLIPPED = 1;
export const ELBOW_MINUS = 2;
export const WRIST_FLIPPED = 4;

/**
 * Seven turning joints: three through the shoulder, an elbow, three through the wrist, by arm angle (Shimizu et al. 2008): how far the elbow
 * is swung about the line from shoulder to wrist, from 0 where it is uppermost along axis 1. An elbow that lies off the
 * shoulder's and the wrist's lines is allowed for.
 */
export function sevenAxisSolver(chain: Chain): ClosedForm | null {
  if (chain.joints !== 7 || chain.coupling || chain.prismatic.includes(1)) return null;
  const axes = axesOf(chain);
  const { directions: z, points: p, flange: zero } = axes;
  const shoulder = meetingPoint(axes, 0);
  const centre = meetingPoint(axes, 4);
  const shoulderTurns = makeThreeTurns(z.slice(0, 3));
  const wristTurns = makeThreeTurns(z.slice(4));
  if (!shoulder || !centre || !shoulderTurns || !wristTurns) return null;

  const foot = (point: Triple) => along(p[3], z[3], dot(minus(point, p[3]), z[3]));
  const toElbow = minus(foot(shoulder), shoulder);
  const fromElbow = minus(centre, foot(centre));
  const rise = dot(minus(centre, shoulder), z[3]);
  const upper = length(toElbow);
  const fore = length(fromElbow);
  // A rise along the elbow's axis would leave the swing undefined where the arm folds onto it; such arms are solved by descent.
  if (upper < SAME || fore < SAME || Math.abs(rise) > SAME) return null;
  const zeroBend = Math.atan2(dot(z[3], crossOf(toElbow, fromElbow)), dot(toElbow, fromElbow));
  const straightElbow = length(crossOf(toElbow, z[2])) < SAME && length(crossOf(fromElbow, z[4])) < SAME;

  const wrist = inFlange(zero, centre);
  const branches = makeBranches(8, 7);
  const { values, codes } = branches;
  const whole = new Float64Array(9);
  const first = new Float64Array(9);
  const rest = new Float64Array(9);
  /** From shoulder to wrist, the side of it that the elbow lies on, and what is square to both: where they are to be, and at the zero posture. */
  const [line, side, third, zeroLine, zeroSide, zeroThird, column] = Array.from(
    { length: 7 },
    () => new Float64Array(3),
  );

  function solve(flange: Transform, armAngle = 0): Branches {
    branches.count = 0;
    branches.shortfall = 'none';
    branches.by = 0;
    placeInFlange(flange, wrist, line);
    addScaled(line, shoulder!, -1, line);
    const distance = Math.sqrt(dotOf(line, line));
    const bend = elbowAngle(distance * distance, upper, fore);
    if (Number.isNaN(bend)) {
      const far = distance > upper + fore;
      branches.shortfall = far ? 'too far' : 'too near';
      branches.by = far ? distance - upper - fore : Math.abs(upper - fore) - distance;
      return branches;
    }
    rotationFromZero(flange, zero, whole);
    // A wrist on the shoulder has no line to swing about; any will do.
    if (distance < SAME) line.set(z[0]);
    else toUnit(line);
    swing(line, z[0], armAngle, side);
    cross(line, side, third);
    for (let way = 0; way < 2; way++) {
      solveElbow(way === 0 ? bend : -bend, way === 0 ? 0 : ELBOW_MINUS);
      if (bend === 0) break;
    }
    return branches;
  }

  function solveElbow(bend: number, code: number) {
    const q4 = wrapped(bend - zeroBend);
    const c = Math.cos(q4);
    const s = Math.sin(q4);
    turn(fromElbow, z[3], c, s, zeroLine);
    addScaled(zeroLine, toElbow, 1, zeroLine);
    if (dotOf(zeroLine, zeroLine) < SAME * SAME) zeroLine.set(toElbow);
    toUnit(zeroLine);
    // The elbow lies on this side of the line; taken from its axis, which stays square to the line when the arm stretches.
    cross(zeroLine, z[3], zeroSide);
    if (bend < 0) addScaled(zeroSide, zeroSide, -2, zeroSide);
    cross(zeroLine, zeroSide, zeroThird);
    for (let i = 0; i < 3; i++)
      for (let j = 0; j < 3; j++)
        first[3 * i + j] = line[i] * zeroLine[j] + side[i] * zeroSide[j] + third[i] * zeroThird[j];
    leaveOver(c, s);
    const shoulders = shoulderTurns!.solve(first);
    const wrists = wristTurns!.solve(rest);
    for (let a = 0; a < shoulders; a++)
      for (let w = 0; w < wrists; w++) {
        const at = 7 * branches.count;
        for (let i = 0; i < 3; i++) {
          values[at + i] = shoulderTurns!.angles[3 * a + i];
          values[at + 4 + i] = wristTurns!.angles[3 * w + i];
        }
        values[at + 3] = q4;
        codes[branches.count++] = code | (a === 0 ? 0 : SHOULDER_FLIPPED) | (w === 0 ? 0 : WRIST_FLIPPED);
      }
  }

  /** rest = (first · turn of joint 4)ᵀ · whole: what is left for the wrist. `c`, `s`: of joint 4. */
  function leaveOver(c: number, s: number) {
    for (let j = 0; j < 3; j++) {
      for (let row = 0; row < 3; row++)
        column[row] = first[row] * whole[j] + first[3 + row] * whole[3 + j] + first[6 + row] * whole[6 + j];
      turn(column, z[3], c, -s, column);
      for (let row = 0; row < 3; row++) rest[3 * row + j] = column[row];
    }
  }

  return {
    branches,
    classes: 8,
    family: { from: -Math.PI, to: Math.PI, closed: true, samples: SAMPLES },
    solve,
    nameOf,
    // Without offsets an elbow bent the other way is the same arm with joints 3 and 5 half a turn on.
    shapeOf: straightElbow ? () => 0 : (code) => code & ELBOW_MINUS,
  };
}

function nameOf(code: number): string {
  const shoulder = code & SHOULDER_FLIPPED ? 'shoulder flipped' : 'shoulder plain';
  const elbow = code & ELBOW_MINUS ? 'elbow minus' : 'elbow plus';
  const wrist = code & WRIST_FLIPPED ? 'wrist flipped' : 'wrist plain';
  return `${shoulder}, ${elbow}, ${wrist}`;
}

/** Length of what is left of `up` square to the line below which no side counts as the uppermost. */
const UPRIGHT = 1e-6;
const OTHERS: readonly Triple[] = [
  [1, 0, 0],
  [0, 1, 0],
];

/** The direction square to `line` that leans most towards `up`, swung about the line. */
function swing(line: Vector, up: Triple, angle: number, out: Vector) {
  addScaled(up, line, -dotOf(up, line), out);
  if (dotOf(out, out) < UPRIGHT * UPRIGHT) {
    // Straight above or below the shoulder there is no uppermost side; one fixed direction stands in.
    const other = Math.abs(line[0]) < 0.9 ? OTHERS[0] : OTHERS[1];
    addScaled(other, line, -dotOf(other, line), out);
  }
  toUnit(out);
  turn(out, line, Math.cos(angle), Math.sin(angle), out);
}
