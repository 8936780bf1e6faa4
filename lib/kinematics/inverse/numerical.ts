import { forward, jacobian, makeStance, type Chain } from '../chain';
import { withinLimits } from '../limits';
import { invertSmall } from '../measures/small-matrix';
import type { Transform } from '../transforms';

/**
 * Inverse kinematics for chains without a closed form: damped least squares (Wampler 1986; Nakamura & Hanafusa 1986) from several
 * starts, damping by Levenberg's rule (less where a step helps, more where it does not). Same input, same answer: the starts are fixed.
 */

const STARTS = 24;
const STEPS = 120;
/** m and rad: what counts as there, well inside the 1e-9 that callers are promised. */
const THERE = 1e-11;
/** Two postures closer than this (rad, m) are one solution. */
const SAME_POSTURE = 1e-6;

export interface NumericalAnswer {
  readonly solutions: number[][];
  /** Least error over all starts: m and rad together, as a root sum of squares. */
  readonly residual: number;
  readonly stop: 'found' | 'stalled' | 'out of steps';
  /** True where a start arrived, but outside the limits. */
  readonly outsideLimits: boolean;
}

/**
 * `freedoms`: rows of the Jacobian that have to match. `freeRoll`: only the direction of the tool's z axis counts, not its roll.
 * `target`: tool pose in the frame that the base is given in.
 */
export function solveNumerically(
  chain: Chain,
  freedoms: readonly number[],
  target: Transform,
  freeRoll: boolean,
): NumericalAnswer {
  const solutions: number[][] = [];
  let residual = Infinity;
  let stop: NumericalAnswer['stop'] = 'stalled';
  let outsideLimits = false;
  const descend = makeDescent(chain, freedoms, target, freeRoll);
  for (let start = 0; start < STARTS; start++) {
    const u = startPosture(chain, start);
    const result = descend(u);
    if (result.error < residual) {
      residual = result.error;
      stop = result.stop;
    }
    if (result.error > THERE) continue;
    if (!withinLimits(chain, u)) outsideLimits = true;
    else if (!solutions.some((known) => known.every((value, i) => Math.abs(value - u[i]) < SAME_POSTURE)))
      solutions.push(Array.from(u));
  }
  return { solutions, residual, stop, outsideLimits };
}

/** The middle of every range first, then points of a Kronecker sequence (multiples of roots of primes, modulo 1). */
function startPosture(chain: Chain, start: number): Float64Array {
  const roots = [2, 3, 5, 7, 11, 13, 17, 19, 23, 29, 31, 37].map(Math.sqrt);
  return Float64Array.from({ length: chain.actuators }, (_, i) => {
    const share = start === 0 ? 0.5 : 0.05 + 0.9 * ((start * roots[i % roots.length]) % 1);
    // Joints with many turns start within one turn of their middle: farther copies are the same posture.
    const middle = (chain.min[i] + chain.max[i]) / 2;
    const range = Math.min(chain.max[i] - chain.min[i], 2 * Math.PI);
    return middle + (share - 0.5) * range;
  });
}

function makeDescent(chain: Chain, freedoms: readonly number[], target: Transform, freeRoll: boolean) {
  const n = chain.actuators;
  const stance = makeStance(chain);
  const matrix = new Float64Array(6 * n);
  const error = new Float64Array(6);
  const trial = new Float64Array(n);
  const normal = new Float64Array(n * n);
  const inverse = new Float64Array(n * n);
  const gradient = new Float64Array(n);

  const measure = (u: Float64Array): number => {
    forward(chain, u, stance);
    poseError(stance.tool, target, freeRoll, error);
    let sum = 0;
    for (const row of freedoms) sum += error[row] * error[row];
    return Math.sqrt(sum);
  };

  return (u: Float64Array): { error: number; stop: NumericalAnswer['stop'] } => {
    let size = measure(u);
    let damping = 1e-2;
    for (let step = 0; step < STEPS; step++) {
      if (size <= THERE) return { error: size, stop: 'found' };
      jacobian(chain, stance, matrix);
      // Near the goal the damping fades with the error, which makes the last steps Newton steps.
      const lambda = damping * Math.min(1, size);
      for (let i = 0; i < n; i++) {
        gradient[i] = 0;
        for (const row of freedoms) gradient[i] += matrix[row * n + i] * error[row];
        for (let j = 0; j < n; j++) {
          let sum = i === j ? lambda + 1e-14 : 0;
          for (const row of freedoms) sum += matrix[row * n + i] * matrix[row * n + j];
          normal[i * n + j] = sum;
        }
      }
      if (!invertSmall(normal, n, inverse)) {
        damping = Math.max(damping * 10, 1e-6);
        measure(u);
        if (damping > 1e6) return { error: size, stop: 'stalled' };
        continue;
      }
      for (let i = 0; i < n; i++) {
        let move = 0;
        for (let j = 0; j < n; j++) move += inverse[i * n + j] * gradient[j];
        trial[i] = clampToRange(chain, i, u[i] + move);
      }
      const next = measure(trial);
      if (next < size) {
        u.set(trial);
        size = next;
        damping = Math.max(damping / 5, 1e-12);
      } else {
        damping *= 4;
        if (damping > 1e6) return { error: size, stop: 'stalled' };
        measure(u);
      }
    }
    return { error: size, stop: 'out of steps' };
  };
}

function clampToRange(chain: Chain, i: number, value: number): number {
  return Math.min(chain.max[i], Math.max(chain.min[i], value));
}

/** What is still missing: position (m), then a rotation vector (rad), or for a free roll the turn that lays z on z. */
function poseError(pose: Transform, target: Transform, freeRoll: boolean, out: Float64Array) {
  out[0] = target[3] - pose[3];
  out[1] = target[7] - pose[7];
  out[2] = target[11] - pose[11];
  let sx: number;
  let sy: number;
  let sz: number;
  let cosine: number;
  if (freeRoll) {
    sx = pose[6] * target[10] - pose[10] * target[6];
    sy = pose[10] * target[2] - pose[2] * target[10];
    sz = pose[2] * target[6] - pose[6] * target[2];
    cosine = pose[2] * target[2] + pose[6] * target[6] + pose[10] * target[10];
  } else {
    // Half the sum of the cross products of matching axes: axis times sine of the turn from pose to target.
    sx = sy = sz = 0;
    let trace = 0;
    for (let c = 0; c < 3; c++) {
      sx += pose[4 + c] * target[8 + c] - pose[8 + c] * target[4 + c];
      sy += pose[8 + c] * target[c] - pose[c] * target[8 + c];
      sz += pose[c] * target[4 + c] - pose[4 + c] * target[c];
      trace += pose[c] * target[c] + pose[4 + c] * target[4 + c] + pose[8 + c] * target[8 + c];
    }
    sx /= 2;
    sy /= 2;
    sz /= 2;
    cosine = (trace - 1) / 2;
  }
  const sine = Math.hypot(sx, sy, sz);
  const angle = Math.atan2(sine, cosine);
  // Facing the other way the axis is undefined; any push off that spot will do.
  const scale = sine > 1e-12 ? angle / sine : 1;
  out[3] = sine > 1e-12 || cosine > 0 ? sx * scale : Math.PI;
  out[4] = sy * scale;
  out[5] = sz * scale;
}
