import { compileChain } from '@/lib/kinematics/chain';
import { DOUBTFUL } from '@/lib/kinematics/fast/branch-pairs';
import {
  ICN,
  LARGEST_GAIN,
  makePoseConditionGauge,
  makeSixAxisGauge,
  MAXIMUM_SPEED,
  SMALLEST_GAIN,
  SURE_SPEED,
  TRANSLATIONAL_ICN,
} from '@/lib/kinematics/fast/six-axis-gauge';
import { WORKLOAD_ARM } from '@/lib/kinematics/testing/grid-workload';

/** The fixed workload: 200 × 200 spots, tool straight down, fixed roll, best branch of each spot. */

export const SIDE = 200;
export const LENGTH_M = 0.5;
export type Kind = 'T' | 'TF' | 'TFP';

export interface Totals {
  reach: number;
  inlimit: number;
  evals: number;
  best: number;
  ickT: number;
  vmax: number;
  vg: number;
}

export const noTotals = (): Totals => ({ reach: 0, inlimit: 0, evals: 0, best: 0, ickT: 0, vmax: 0, vg: 0 });

/** Tool pose of a cell of the workload into `tool`. */
export function placeTool(tool: Float64Array, cell: number) {
  tool[3] = -1.7 + (3.4 * (cell % SIDE)) / (SIDE - 1);
  tool[7] = -1.7 + (3.4 * Math.floor(cell / SIDE)) / (SIDE - 1);
}

export const downwards = (): Float64Array => Float64Array.of(1, 0, 0, 0, 0, -1, 0, 0, 0, 0, -1, 0.3);

/**
 * T: translational block; TF: the full matrix too, angular rows times half a metre, and the best branch by that one; TFP: exact polytope speeds of the
 * best branch instead of ellipsoid gains. Each kind has a loop of its own, as each is compiled for itself.
 */
export function makeWorkload(kind: Kind): () => Totals {
  const chain = compileChain(WORKLOAD_ARM);
  return kind === 'T' ? translational(chain) : full(chain, kind === 'TFP');
}

function translational(chain: ReturnType<typeof compileChain>): () => Totals {
  const gauge = makeSixAxisGauge(chain, 'free', false)!;
  const { branches, reading } = gauge;
  const tool = downwards();
  const best = new Float64Array(3);
  return () => {
    const totals = noTotals();
    const sums = new Float64Array(3);
    branches.orient(tool);
    for (let cell = 0; cell < SIDE * SIDE; cell++) {
      placeTool(tool, cell);
      const count = branches.solve(tool);
      if (count === DOUBTFUL) throw new Error('The workload has a spot that the quick path leaves to the reference.');
      best[0] = -1;
      for (let pair = 0; pair < count; pair++) {
        const flips = branches.inside[pair];
        if (flips === 0) continue;
        totals.inlimit += flips === 3 ? 2 : 1;
        totals.evals++;
        gauge.read(pair);
        if (reading[ICN] <= best[0]) continue;
        best[0] = reading[ICN];
        best[1] = reading[LARGEST_GAIN];
        best[2] = reading[SMALLEST_GAIN];
      }
      if (best[0] < 0) continue;
      totals.reach++;
      for (let k = 0; k < 3; k++) sums[k] += best[k];
    }
    return { ...totals, best: sums[0], ickT: sums[0], vmax: sums[1], vg: sums[2] };
  };
}

function full(chain: ReturnType<typeof compileChain>, polytope: boolean): () => Totals {
  const gauge = makePoseConditionGauge(chain, LENGTH_M, false)!;
  const { branches, reading } = gauge;
  const tool = downwards();
  const best = new Float64Array(4);
  const [most, least] = polytope ? [MAXIMUM_SPEED, SURE_SPEED] : [LARGEST_GAIN, SMALLEST_GAIN];
  return () => {
    const totals = noTotals();
    const sums = new Float64Array(4);
    branches.orient(tool);
    for (let cell = 0; cell < SIDE * SIDE; cell++) {
      placeTool(tool, cell);
      const count = branches.solve(tool);
      if (count === DOUBTFUL) throw new Error('The workload has a spot that the quick path leaves to the reference.');
      best[0] = -1;
      for (let pair = 0; pair < count; pair++) {
        const flips = branches.inside[pair];
        if (flips === 0) continue;
        totals.inlimit += flips === 3 ? 2 : 1;
        totals.evals++;
        gauge.read(pair);
        if (reading[ICN] <= best[0]) continue;
        // As maps do: what is only told of the best branch is only measured where a branch leads.
        gauge.readTranslational();
        if (polytope) gauge.readSpeeds();
        best[0] = reading[ICN];
        best[1] = reading[TRANSLATIONAL_ICN];
        best[2] = reading[most];
        best[3] = reading[least];
      }
      if (best[0] < 0) continue;
      totals.reach++;
      for (let k = 0; k < 4; k++) sums[k] += best[k];
    }
    return { ...totals, best: sums[0], ickT: sums[1], vmax: sums[2], vg: sums[3] };
  };
}
