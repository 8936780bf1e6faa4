import { forward, jacobian, makeStance, type Chain } from '../chain';
import { invertSmall } from '../measures/small-matrix';
import type { Transform } from '../transforms';
import { poseError } from './pose-error';

const STEPS = 120;
/** m and rad: what counts as there, well inside the 1e-9 that callers are promised. */
export const THERE = 1e-11;

export interface DescentResult {
  /** Least error arrived at: m and rad together, as a root sum of squares over the rows that have to match. */
  readonly error: number;
  readonly stop: 'found' | 'stalled' | 'out of steps';
}

/** Moves `u` (actuators) downhill in place, inside the limits or not. */
export type Descent = (u: Float64Array, target: Transform, insideLimits: boolean) => DescentResult;

/**
 * Damped least squares (Wampler 1986; Nakamura & Hanafusa 1986), damping by Levenberg's rule: less where a step helps, more where it
 * does not. `rows` of the Jacobian have to match; with a free roll only the direction of the tool's z axis counts.
 * Inside the limits, a joint that stands at one and is pushed outward is left out of the step, so that the others go on.
 */
export function makeDescent(chain: Chain, rows: readonly number[], freeRoll: boolean): Descent {
  const n = chain.actuators;
  const stance = makeStance(chain);
  const matrix = new Float64Array(6 * n);
  const scratch = new Float64Array(6 * chain.joints);
  const error = new Float64Array(6);
  const trial = new Float64Array(n);
  const normal = new Float64Array(n * n);
  const inverse = new Float64Array(n * n);
  const gradient = new Float64Array(n);

  const measure = (u: Float64Array, target: Transform): number => {
    forward(chain, u, stance);
    poseError(stance.tool, target, freeRoll, error);
    let sum = 0;
    for (const row of rows) sum += error[row] * error[row];
    return Math.sqrt(sum);
  };

  const isStopped = (u: Float64Array, i: number) =>
    (u[i] >= chain.max[i] && gradient[i] > 0) || (u[i] <= chain.min[i] && gradient[i] < 0);

  function buildNormal(u: Float64Array, lambda: number, insideLimits: boolean) {
    for (let i = 0; i < n; i++) {
      gradient[i] = 0;
      for (const row of rows) gradient[i] += matrix[row * n + i] * error[row];
      for (let j = 0; j < n; j++) {
        let sum = i === j ? lambda + 1e-14 : 0;
        for (const row of rows) sum += matrix[row * n + i] * matrix[row * n + j];
        normal[i * n + j] = sum;
      }
    }
    if (!insideLimits) return;
    for (let i = 0; i < n; i++) {
      if (!isStopped(u, i)) continue;
      gradient[i] = 0;
      for (let j = 0; j < n; j++) normal[i * n + j] = normal[j * n + i] = i === j ? 1 : 0;
    }
  }

  return (u, target, insideLimits) => {
    let size = measure(u, target);
    let damping = 1e-2;
    for (let step = 0; step < STEPS; step++) {
      if (size <= THERE) return { error: size, stop: 'found' };
      jacobian(chain, stance, matrix, scratch);
      // Near the goal the damping fades with the error, which makes the last steps Newton steps.
      buildNormal(u, damping * Math.min(1, size), insideLimits);
      let next = Infinity;
      if (invertSmall(normal, n, inverse)) {
        for (let i = 0; i < n; i++) {
          let move = 0;
          for (let j = 0; j < n; j++) move += inverse[i * n + j] * gradient[j];
          trial[i] = insideLimits ? Math.min(chain.max[i], Math.max(chain.min[i], u[i] + move)) : u[i] + move;
        }
        next = measure(trial, target);
      }
      if (next < size) {
        u.set(trial);
        size = next;
        damping = Math.max(damping / 5, 1e-12);
      } else {
        damping = Math.max(damping * 4, 1e-6);
        if (damping > 1e6) return { error: size, stop: 'stalled' };
        measure(u, target);
      }
    }
    return { error: size, stop: 'out of steps' };
  };
}
