import type { Chain } from '../chain';
import type { Transform } from '../transforms';
import { axesOf, inFlange, meetingPoint, rotationFromZero } from './axes';
import { elbowAngle, makeBranches, type Branches, type ClosedForm } from './closed-form';
import { along, cross, dot, length, minus, type Triple } from './lines';
import { makeThreeTurns } from './three-turns';
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
  const zeroBend = Math.atan2(dot(z[3], cross(toElbow, fromElbow)), dot(toElbow, fromElbow));
  const straightElbow = length(cross(toElbow, z[2])) < SAME && length(cross(fromElbow, z[4])) < SAME;

  const wrist = inFlange(zero, centre);
  const branches = makeBranches(8, 7);
  const { values, codes } = branches;
  const whole = new Float64Array(9);
  const first = new Float64Array(9);
  const rest = new Float64Array(9);

  function solve(flange: Transform, armAngle = 0): Branches {
    branches.count = 0;
    branches.shortfall = 'none';
    branches.by = 0;
    const target = [0, 4, 8].map(
      (row, i) =>
        flange[row] * wrist[0] +
        flange[row + 1] * wrist[1] +
        flange[row + 2] * wrist[2] +
        flange[row + 3] -
        shoulder![i],
    ) as Triple;
    const distance = length(target);
    const bend = elbowAngle(distance * distance, upper, fore);
    if (Number.isNaN(bend)) {
      const far = distance > upper + fore;
      branches.shortfall = far ? 'too far' : 'too near';
      branches.by = far ? distance - upper - fore : Math.abs(upper - fore) - distance;
      return branches;
    }
    rotationFromZero(flange, zero, whole);
    // A wrist on the shoulder has no line to swing about; any will do.
    const line = distance < SAME ? z[0] : unit(target);
    const elbowSide = swung(line, z[0], armAngle);
    for (let way = 0; way < 2; way++) {
      solveElbow(line, elbowSide, way === 0 ? bend : -bend, way === 0 ? 0 : ELBOW_MINUS);
      if (bend === 0) break;
    }
    return branches;
  }

  function solveElbow(line: Triple, elbowSide: Triple, bend: number, code: number) {
    const q4 = wrapped(bend - zeroBend);
    const bent = turnedBy(fromElbow, z[3], q4);
    const reach = along(toElbow, bent, 1);
    const size = length(reach);
    const zeroLine = size < SAME ? unit(toElbow) : unit(reach);
    // The elbow lies on this side of the line; taken from its axis, which stays square to the line when the arm stretches.
    const zeroSide = scaled(cross(zeroLine, z[3]), bend < 0 ? -1 : 1);
    const zeroThird = cross(zeroLine, zeroSide);
    const third = cross(line, elbowSide);
    for (let i = 0; i < 3; i++)
      for (let j = 0; j < 3; j++)
        first[3 * i + j] = line[i] * zeroLine[j] + elbowSide[i] * zeroSide[j] + third[i] * zeroThird[j];
    leaveOver(q4);
    const shoulders = shoulderTurns!.solve(first);
    const wrists = wristTurns!.solve(rest);
    for (let s = 0; s < shoulders; s++)
      for (let w = 0; w < wrists; w++) {
        const at = 7 * branches.count;
        for (let i = 0; i < 3; i++) {
          values[at + i] = shoulderTurns!.angles[3 * s + i];
          values[at + 4 + i] = wristTurns!.angles[3 * w + i];
        }
        values[at + 3] = q4;
        codes[branches.count++] = code | (s === 0 ? 0 : SHOULDER_FLIPPED) | (w === 0 ? 0 : WRIST_FLIPPED);
      }
  }

  /** rest = (first · turn of joint 4)ᵀ · whole: what is left for the wrist. */
  function leaveOver(q4: number) {
    for (let column = 0; column < 3; column++) {
      const back: Triple = [0, 1, 2].map(
        (row) => first[row] * whole[column] + first[3 + row] * whole[3 + column] + first[6 + row] * whole[6 + column],
      ) as Triple;
      const turned = turnedBy(back, z[3], -q4);
      for (let row = 0; row < 3; row++) rest[3 * row + column] = turned[row];
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

const scaled = (v: Triple, by: number): Triple => [v[0] * by, v[1] * by, v[2] * by];
const unit = (v: Triple): Triple => scaled(v, 1 / length(v));

/** v turned about a unit axis (Rodrigues' formula). */
function turnedBy(v: Triple, axis: Triple, angle: number): Triple {
  const c = Math.cos(angle);
  return along(along(scaled(v, c), cross(axis, v), Math.sin(angle)), axis, dot(axis, v) * (1 - c));
}

/** The direction square to `line` that leans most towards `up`, swung about the line. */
function swung(line: Triple, up: Triple, angle: number): Triple {
  let side = along(up, line, -dot(up, line));
  if (length(side) < 1e-6) {
    // Straight above or below the shoulder there is no uppermost side; one fixed direction stands in.
    const other: Triple = Math.abs(line[0]) < 0.9 ? [1, 0, 0] : [0, 1, 0];
    side = along(other, line, -dot(other, line));
  }
  return turnedBy(unit(side), line, angle);
}
