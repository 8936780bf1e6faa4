import type { Chain } from '../chain';

/** One place of a path that an arm follows. */
export interface PathSample {
  /** Length along the path up to here, m. */
  readonly atM: number;
  readonly posture: ArrayLike<number>;
}

export interface PathTime {
  readonly seconds: number;
  /** Speed that the joints allow at each sample (m/s), before ramps and the wanted speed. */
  readonly allowed: Float64Array;
  /** Speed gone at each sample, m/s. */
  readonly gone: Float64Array;
  /** Time at each sample, s. */
  readonly at: Float64Array;
  /** Zero-based actuator that bounds the speed at each sample; −1 where none moves. */
  readonly binding: Int8Array;
}

/**
 * The quickest run along a followed path from rest to rest under the joints' speeds and accelerations and an upper tool speed (m/s,
 * may be infinite): the phase plane method of Bobrow, Dubowsky & Gibson 1985 and Shin & McKay 1985, with limits on joints in place of
 * torques. Derivatives of the joints along the path are differences of neighbouring samples, so samples lie close.
 */
export function timePath(chain: Chain, samples: readonly PathSample[], upperSpeed: number): PathTime {
  const count = samples.length;
  const allowed = new Float64Array(count).fill(Infinity);
  const binding = new Int8Array(count).fill(-1);
  const gone = new Float64Array(count);
  const at = new Float64Array(count);
  if (count < 2) return { seconds: 0, allowed, gone, at, binding };

  const slope = new Float64Array(count * chain.actuators);
  const bend = new Float64Array(count * chain.actuators);
  differentiate(chain.actuators, samples, slope, bend);
  const ceiling = new Float64Array(count);
  for (let k = 0; k < count; k++) {
    let curve = Infinity;
    for (let i = 0; i < chain.actuators; i++) {
      const q1 = Math.abs(slope[k * chain.actuators + i]);
      const q2 = Math.abs(bend[k * chain.actuators + i]);
      const speed = q1 > 0 ? chain.maxSpeed[i] / q1 : Infinity;
      if (speed < allowed[k]) {
        allowed[k] = speed;
        binding[k] = i;
      }
      // A bent way costs acceleration even at an even speed.
      if (q2 > 0) curve = Math.min(curve, Math.sqrt(chain.maxAcceleration[i] / q2));
    }
    ceiling[k] = Math.min(allowed[k], curve, upperSpeed);
  }

  const accelerationAt = accelerations(chain, slope, bend);
  ramp(samples, accelerationAt, ceiling, gone);
  for (let k = 1; k < count; k++) {
    const step = samples[k].atM - samples[k - 1].atM;
    const acceleration = Math.min(accelerationAt(k - 1, gone[k - 1]), accelerationAt(k, gone[k]));
    const cap = Math.min(ceiling[k - 1], ceiling[k]);
    at[k] = at[k - 1] + intervalTime(step, gone[k - 1], gone[k], acceleration, cap);
  }
  return { seconds: at[count - 1], allowed, gone, at, binding };
}

function differentiate(n: number, samples: readonly PathSample[], slope: Float64Array, bend: Float64Array): void {
  const last = samples.length - 1;
  for (let k = 0; k <= last; k++) {
    const [before, after] = [Math.max(0, k - 1), Math.min(last, k + 1)];
    const [left, right] = [samples[k].atM - samples[before].atM, samples[after].atM - samples[k].atM];
    for (let i = 0; i < n; i++) {
      const q = samples[k].posture[i];
      const rise = left > 0 ? (q - samples[before].posture[i]) / left : null;
      const fall = right > 0 ? (samples[after].posture[i] - q) / right : null;
      // The steeper side: a speed that is allowed is allowed on both.
      slope[k * n + i] = rise === null ? (fall ?? 0) : fall === null || Math.abs(rise) > Math.abs(fall) ? rise : fall;
      bend[k * n + i] = rise === null || fall === null ? 0 : (2 * (fall - rise)) / (left + right);
    }
  }
}

/**
 * Time (s) of one interval between two speeds: up as far as there is room for, on at the cap, and down again. Without it a ramp that is
 * shorter than an interval would be drawn out over all of it.
 */
function intervalTime(step: number, from: number, to: number, acceleration: number, cap: number): number {
  if (step === 0) return 0;
  // No joint moves: nothing takes time.
  if (acceleration === Infinity) return cap === Infinity ? 0 : step / cap;
  if (acceleration <= 0) return from + to > 0 ? (2 * step) / (from + to) : Infinity;
  const peak = Math.max(from, to, Math.min(cap, Math.sqrt(acceleration * step + (from * from + to * to) / 2)));
  const ramps = (2 * peak * peak - from * from - to * to) / (2 * acceleration);
  return (2 * peak - from - to) / acceleration + Math.max(0, step - ramps) / peak;
}

/** Acceleration along the path (m/s²) that all joints can give at a sample and a speed; infinite where none moves. */
type AccelerationAt = (k: number, speed: number) => number;

function accelerations(chain: Chain, slope: Float64Array, bend: Float64Array): AccelerationAt {
  const n = chain.actuators;
  return (k, speed) => {
    let least = Infinity;
    for (let i = 0; i < n; i++) {
      const q1 = Math.abs(slope[k * n + i]);
      if (q1 === 0) continue;
      const left = chain.maxAcceleration[i] - Math.abs(bend[k * n + i]) * speed * speed;
      least = Math.min(least, Math.max(0, left) / q1);
    }
    return least;
  };
}

/** Speeds up from rest as fast as the joints let it, then takes away what cannot be braked in time. */
function ramp(
  samples: readonly PathSample[],
  accelerationAt: AccelerationAt,
  ceiling: Float64Array,
  gone: Float64Array,
): void {
  const last = samples.length - 1;
  const reachable = (k: number, step: number): number =>
    step === 0 ? gone[k] : Math.sqrt(gone[k] ** 2 + 2 * step * accelerationAt(k, gone[k]));
  gone[0] = 0;
  for (let k = 0; k < last; k++)
    gone[k + 1] = Math.min(ceiling[k + 1], reachable(k, samples[k + 1].atM - samples[k].atM));
  gone[last] = 0;
  for (let k = last; k > 0; k--) gone[k - 1] = Math.min(gone[k - 1], reachable(k, samples[k].atM - samples[k - 1].atM));
}
