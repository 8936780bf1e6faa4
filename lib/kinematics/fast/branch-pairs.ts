import type { Chain } from '../chain';
import { dot, type Triple } from '../inverse/lines';
import { recognise, type Geometry } from '../inverse/spherical-wrist';
import { LIMIT_SLACK } from '../limits';
import { identityTransform, invertTransform, type Transform } from '../transforms';

/**
 * The branches of a six-axis arm with a spherical wrist by algebra alone: sines and cosines come from square roots, limits are tested on
 * cosines, and no angle is ever taken. A pair is a shoulder side and an elbow way; its two wrist flips differ in the sign of one column of the
 * Jacobian, so they measure alike. Spots where this loses digits are called doubtful and left to the reference in inverse/spherical-wrist.
 *
 * All numbers live in typed arrays: a double that passes a call as argument or result may be put on the heap.
 */

/** Numbers a pair, at pair × PAIR in `pairs`; the names below are offsets. */
export const PAIR = 16;
/** cos q1, sin q1, then the wrist centre's signed distance from axis 1 (m). */
export const C1 = 0;
export const S1 = 1;
export const X = 2;
/** Shoulder to wrist centre in the arm's plane (m). */
export const DX = 3;
export const DZ = 4;
/** Directions of upper arm (A) and forearm (B), from z towards x; sine of the elbow between them. */
export const SA = 5;
export const CA = 6;
export const SB = 7;
export const CB = 8;
export const S_ELBOW = 9;
/** Lean of the wrist's base; joints 4 and 5 of the plain flip (sin q5 > 0, counted from the aligned wrist). */
export const S_LEAN = 10;
export const C_LEAN = 11;
export const C4 = 12;
export const S4 = 13;
export const S5 = 14;
export const C5 = 15;

/** Tool point, wrist centre less tool point, and the last axis, each x y z in the frame of axis 1 (m). */
export const TOOL = 0;
export const OFFSET = 3;
export const LAST_AXIS = 6;
/** Cosine and sine of joint 6 in the plain flip, after `fillSixth`. */
export const SIXTH = 9;

/** What `solve` answers in place of a number of pairs. */
export const DOUBTFUL = -1;
export const TOO_FAR = -2;
export const TOO_NEAR = -3;

export const PLAIN = 1;
export const FLIPPED = 2;

/** Lengths of the arm in its plane (m), as in inverse/spherical-wrist. */
export interface PlaneLengths {
  readonly shoulderX: number;
  readonly shoulderZ: number;
  readonly lateral: number;
  readonly upper: number;
  readonly fore: number;
  /** Columns z5 × z4, z5, z4 at the zero posture in the frame of axis 1, row after row. */
  readonly wristBasis: Float64Array;
}

export interface BranchPairs {
  readonly lengths: PlaneLengths;
  readonly pairs: Float64Array;
  /** Class of each pair's plain flip (inverse/spherical-wrist), and which flips stand inside the limits: PLAIN | FLIPPED. */
  readonly codes: Uint8Array;
  readonly inside: Uint8Array;
  readonly shared: Float64Array;
  /** Cosine and sine of the angle at which each joint stands mid-range, counted as in `pairs` (joint 3: by the elbow, times `turn3`). */
  readonly windows: Float64Array;
  readonly turn3: number;
  /** Cosine of half of each joint's range; −2 where any angle will do. */
  readonly edges: Float64Array;
  /** Tool position in the frame of axis 1 from the frame that the base is given in: 3 × 4, row after row. */
  readonly toAxis: Float64Array;
  /** Takes the rotation of a tool pose; call it before `solve` whenever the rotation changed. */
  orient(tool: Transform): void;
  /** Number of pairs for the position of a tool pose, or DOUBTFUL, TOO_FAR, TOO_NEAR. */
  solve(tool: Transform): number;
  /** Joint 6 of a pair's plain flip, into `shared`. */
  fillSixth(pair: number): void;
}

/** Squared sine of the elbow, share of reach², under which the elbow counts as doubtful: stretched or folded. */
const ELBOW_EDGE = 1e-11;
const ELBOW_CLAMP = 1e-13;
/** m: wrist centre this near to axis 1 is doubtful. Sine: wrist this near to aligned is. */
const AXIS_EDGE = 1e-6;
const WRIST_EDGE = 1e-5;
/** Difference of cosines within which a limit is left to the reference. */
const LIMIT_EDGE = 1e-7;

/** Cosine and sine of the angle at which a joint stands mid-range, cosine of half its range (−2: any angle will do). */
interface Window {
  readonly c: number;
  readonly s: number;
  readonly edge: number;
}

function windowOf(chain: Chain, joint: number, shift: number): Window {
  const range = chain.max[joint] - chain.min[joint];
  const middle = (chain.max[joint] + chain.min[joint]) / 2 + shift;
  const any = range + 2 * LIMIT_SLACK >= 2 * Math.PI;
  return { c: Math.cos(middle), s: Math.sin(middle), edge: any ? -2 : Math.cos(range / 2) };
}

/** Null where the chain is of another kind. `lastIsFree`: joint 6 is taken to stand inside its limits whatever the pose. */
export function makeBranchPairs(chain: Chain, lastIsFree: boolean): BranchPairs | null {
  const g = recognise(chain);
  if (!g) return null;
  const pairs = new Float64Array(4 * PAIR);
  const codes = new Uint8Array(4);
  const inside = new Uint8Array(4);
  const shared = new Float64Array(11);
  const rotated = new Float64Array(9);

  const { toAxis, toWrist, wristInTool } = constants(chain, g);
  const { shoulderX, shoulderZ, lateral, upper, fore } = g;
  const w = g.wristBasis;
  const reachSquare = (upper + fore) ** 2;
  const nearSquare = (upper - fore) ** 2;
  const uf2 = 2 * upper * fore;
  const foreC = Math.cos(g.foreAngle);
  const foreS = Math.sin(g.foreAngle);
  const one = windowOf(chain, 0, 0);
  const two = windowOf(chain, 1, g.upperAngle);
  const three = windowOf(chain, 2, g.turn3 * (g.foreAngle - g.upperAngle));
  const threeS = g.turn3 * three.s;
  const four = windowOf(chain, 3, 0);
  const five = windowOf(chain, 4, g.wristZero);
  const six = windowOf(chain, 5, 0);
  const windows = Float64Array.from([one, two, three, four, five, six].flatMap(({ c, s }) => [c, s]));
  const edges = Float64Array.from([one, two, three, four, five, six], ({ edge }) => edge);
  const six360 = lastIsFree || six.edge === -2;

  function orient(tool: Transform) {
    for (let row = 0; row < 3; row++) {
      const a = toAxis[4 * row] * tool[0] + toAxis[4 * row + 1] * tool[4] + toAxis[4 * row + 2] * tool[8];
      const b = toAxis[4 * row] * tool[1] + toAxis[4 * row + 1] * tool[5] + toAxis[4 * row + 2] * tool[9];
      const c = toAxis[4 * row] * tool[2] + toAxis[4 * row + 1] * tool[6] + toAxis[4 * row + 2] * tool[10];
      for (let column = 0; column < 3; column++)
        rotated[3 * row + column] = a * toWrist[column] + b * toWrist[3 + column] + c * toWrist[6 + column];
      shared[OFFSET + row] = a * wristInTool[0] + b * wristInTool[1] + c * wristInTool[2];
      shared[LAST_AXIS + row] = rotated[3 * row + 2];
    }
  }

  function solve(tool: Transform): number {
    const px = tool[3];
    const py = tool[7];
    const pz = tool[11];
    const ax = toAxis[0] * px + toAxis[1] * py + toAxis[2] * pz + toAxis[3];
    const ay = toAxis[4] * px + toAxis[5] * py + toAxis[6] * pz + toAxis[7];
    const az = toAxis[8] * px + toAxis[9] * py + toAxis[10] * pz + toAxis[11];
    shared[TOOL] = ax;
    shared[TOOL + 1] = ay;
    shared[TOOL + 2] = az;
    const cx = ax + shared[OFFSET];
    const cy = ay + shared[OFFSET + 1];
    const dz = az + shared[OFFSET + 2] - shoulderZ;
    const square = cx * cx + cy * cy;
    const outside = square - lateral * lateral;
    if (outside < AXIS_EDGE * AXIS_EDGE) return outside < -AXIS_EDGE * AXIS_EDGE ? TOO_NEAR : DOUBTFUL;
    const radial = Math.sqrt(outside);
    const perSquare = 1 / square;
    let count = 0;
    let shortfall = TOO_FAR;
    let missedBy = Infinity;
    for (let side = 0; side < 2; side++) {
      const x = side === 0 ? radial : -radial;
      const dx = x - shoulderX;
      const reach = dx * dx + dz * dz;
      const stretched = reachSquare - reach;
      const folded = reach - nearSquare;
      if (stretched < ELBOW_EDGE * reachSquare || folded < ELBOW_EDGE * reachSquare) {
        if (stretched >= -ELBOW_CLAMP * reachSquare && folded >= -ELBOW_CLAMP * reachSquare) return DOUBTFUL;
        const by = stretched < 0 ? Math.sqrt(reach) - (upper + fore) : Math.abs(upper - fore) - Math.sqrt(reach);
        if (by < missedBy) {
          missedBy = by;
          shortfall = stretched < 0 ? TOO_FAR : TOO_NEAR;
        }
        continue;
      }
      const c1 = (cx * x + cy * lateral) * perSquare;
      const s1 = (cy * x - cx * lateral) * perSquare;
      const in1 = c1 * one.c + s1 * one.s - one.edge;
      if (in1 < LIMIT_EDGE && in1 > -LIMIT_EDGE) return DOUBTFUL;
      const cElbow = (stretched < folded ? uf2 - stretched : folded - uf2) / uf2;
      const sElbow = Math.sqrt(stretched * folded) / uf2;
      const perReach = 1 / reach;
      // Rz(−q1) applied to the constant part of the wrist.
      const r0 = c1 * rotated[0] + s1 * rotated[3];
      const r1 = c1 * rotated[1] + s1 * rotated[4];
      const r2 = c1 * rotated[2] + s1 * rotated[5];
      const r3 = c1 * rotated[3] - s1 * rotated[0];
      const r4 = c1 * rotated[4] - s1 * rotated[1];
      const r5 = c1 * rotated[5] - s1 * rotated[2];
      const along = upper + fore * cElbow;
      for (let way = 0; way < 2; way++) {
        const sBend = way === 0 ? sElbow : -sElbow;
        const aside = fore * sBend;
        const ca = (dz * along + dx * aside) * perReach;
        const sa = (dx * along - dz * aside) * perReach;
        const cb = ca * cElbow - sa * sBend;
        const sb = sa * cElbow + ca * sBend;
        const cl = cb * foreC + sb * foreS;
        const sl = sb * foreC - cb * foreS;
        // wristBasisᵀ · Ry(−lean) · last axis: the wrist's direction, which joints 4 and 5 give it.
        const lx = cl * r2 - sl * rotated[8];
        const lz = sl * r2 + cl * rotated[8];
        const w2 = w[0] * lx + w[3] * r5 + w[6] * lz;
        const w5 = w[1] * lx + w[4] * r5 + w[7] * lz;
        const w8 = w[2] * lx + w[5] * r5 + w[8] * lz;
        const sine = Math.sqrt(w2 * w2 + w5 * w5);
        if (sine < WRIST_EDGE) return DOUBTFUL;
        const c4 = w2 / sine;
        const s4 = w5 / sine;

        const in2 = ca * two.c + sa * two.s - two.edge;
        const in3 = cElbow * three.c + sBend * threeS - three.edge;
        const mid4 = c4 * four.c + s4 * four.s;
        const mid5 = w8 * five.c;
        const aside5 = sine * five.s;
        let in6 = 1;
        let out6 = 1;
        if (!six360) {
          const x0 = cl * r0 - sl * rotated[6];
          const z0 = sl * r0 + cl * rotated[6];
          const x1 = cl * r1 - sl * rotated[7];
          const z1 = sl * r1 + cl * rotated[7];
          const s6 = c4 * (w[1] * x0 + w[4] * r3 + w[7] * z0) - s4 * (w[0] * x0 + w[3] * r3 + w[6] * z0);
          const c6 = c4 * (w[1] * x1 + w[4] * r4 + w[7] * z1) - s4 * (w[0] * x1 + w[3] * r4 + w[6] * z1);
          const mid6 = c6 * six.c + s6 * six.s;
          in6 = mid6 - six.edge;
          out6 = -mid6 - six.edge;
        }
        let flips = 0;
        if (near(in2) || near(in3)) return DOUBTFUL;
        if (in1 > 0 && in2 > 0 && in3 > 0) {
          const plain4 = mid4 - four.edge;
          const flipped4 = -mid4 - four.edge;
          const plain5 = mid5 + aside5 - five.edge;
          const flipped5 = mid5 - aside5 - five.edge;
          if (near(plain4) || near(flipped4) || near(plain5) || near(flipped5) || near(in6) || near(out6))
            return DOUBTFUL;
          if (plain4 > 0 && plain5 > 0 && in6 > 0) flips |= PLAIN;
          if (flipped4 > 0 && flipped5 > 0 && out6 > 0) flips |= FLIPPED;
        }
        const at = count * PAIR;
        pairs[at + C1] = c1;
        pairs[at + S1] = s1;
        pairs[at + X] = x;
        pairs[at + DX] = dx;
        pairs[at + DZ] = dz;
        pairs[at + SA] = sa;
        pairs[at + CA] = ca;
        pairs[at + SB] = sb;
        pairs[at + CB] = cb;
        pairs[at + S_ELBOW] = sBend;
        pairs[at + S_LEAN] = sl;
        pairs[at + C_LEAN] = cl;
        pairs[at + C4] = c4;
        pairs[at + S4] = s4;
        pairs[at + S5] = sine;
        pairs[at + C5] = w8;
        codes[count] = side | ((way === 0) !== (side === 0) ? 2 : 0);
        inside[count++] = flips;
      }
    }
    return count > 0 ? count : shortfall;
  }

  function fillSixth(pair: number) {
    const at = pair * PAIR;
    const c1 = pairs[at + C1];
    const s1 = pairs[at + S1];
    const cl = pairs[at + C_LEAN];
    const sl = pairs[at + S_LEAN];
    const c4 = pairs[at + C4];
    const s4 = pairs[at + S4];
    for (let column = 0; column < 2; column++) {
      const x = c1 * rotated[column] + s1 * rotated[3 + column];
      const y = c1 * rotated[3 + column] - s1 * rotated[column];
      const lx = cl * x - sl * rotated[6 + column];
      const lz = sl * x + cl * rotated[6 + column];
      const w3 = w[1] * lx + w[4] * y + w[7] * lz;
      const w0 = w[0] * lx + w[3] * y + w[6] * lz;
      // Column 0 gives the sine, column 1 the cosine.
      shared[SIXTH + 1 - column] = c4 * w3 - s4 * w0;
    }
  }

  return { lengths: g, pairs, codes, inside, shared, windows, turn3: g.turn3, edges, toAxis, orient, solve, fillSixth };
}

const near = (value: number): boolean => value < LIMIT_EDGE && value > -LIMIT_EDGE;

/** toAxis: frame of axis 1 from the frame that the base is given in (3 × 4). toWrist and wristInTool: constant factors behind a tool pose. */
function constants(chain: Chain, g: Geometry) {
  const fromBase = invertTransform(chain.base, identityTransform());
  const toAxis = new Float64Array(12);
  for (let row = 0; row < 3; row++) {
    const f = g.frame[row];
    for (let column = 0; column < 4; column++)
      toAxis[4 * row + column] = f[0] * fromBase[column] + f[1] * fromBase[4 + column] + f[2] * fromBase[8 + column];
    toAxis[4 * row + 3] -= dot(f, g.origin);
  }
  const t = chain.tool;
  const toWrist = new Float64Array(9);
  for (let row = 0; row < 3; row++)
    for (let column = 0; column < 3; column++)
      for (let k = 0; k < 3; k++) toWrist[3 * row + column] += t[4 * k + row] * g.flangeToWrist[3 * k + column];
  const [x, y, z] = g.wristInFlange;
  const away: Triple = [x - t[3], y - t[7], z - t[11]];
  const wristInTool = [0, 1, 2].map(
    (column) => t[column] * away[0] + t[4 + column] * away[1] + t[8 + column] * away[2],
  );
  return { toAxis, toWrist, wristInTool };
}
