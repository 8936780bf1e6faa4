import type { Chain } from '../chain';
import type { WristMode } from '../types';
import { makeMatrixExtremes } from './bidiagonal';
import { makeBranchPairs, type BranchPairs } from './branch-pairs';
import { LARGEST, makeExtremeGains, SMALLEST } from './extreme-gains';
import { makeHeldRows } from './held-rows';
import { makeSlabSpeeds } from './slab-speeds';
import { makeToolColumns } from './tool-columns';
import { makeZonotopeSpeeds } from './zonotope-speeds';

/** Offsets in `reading`: inverse condition number (0 … 1); gains and exact speeds of the velocity set in m/s. */
export const ICN = 0;
export const LARGEST_GAIN = 1;
export const SMALLEST_GAIN = 2;
export const MAXIMUM_SPEED = 3;
export const SURE_SPEED = 4;

/** Share of the largest gain below which the velocity set counts as flat, as in measures/gauge. */
const FLAT = 1e-14;

/** Measures the pairs of a six-axis arm; `read` leaves its answers in `reading`. */
export interface SixAxisGauge {
  readonly branches: BranchPairs;
  readonly reading: Float64Array;
  /** Gains and their ratio. */
  read(pair: number): void;
  /** Exact speeds of the pair last read. */
  readSpeeds(): void;
}

/** Null where the chain is not a six-axis arm with a spherical wrist. */
export function makeSixAxisGauge(chain: Chain, mode: WristMode, lastIsFree: boolean): SixAxisGauge | null {
  const branches = makeBranchPairs(chain, lastIsFree);
  if (!branches) return null;
  return mode === 'free' ? freeGauge(branches, chain.maxSpeed) : heldGauge(branches, chain.maxSpeed);
}

function freeGauge(branches: BranchPairs, maxSpeed: Float64Array): SixAxisGauge {
  const reading = new Float64Array(5);
  const gains = new Float64Array(2);
  const speeds = new Float64Array(2);
  const columns = makeToolColumns(branches, maxSpeed);
  const readGains = makeExtremeGains(columns.linear, gains);
  const readZonotope = makeZonotopeSpeeds(columns.linear, speeds);
  return {
    branches,
    reading,
    read(pair) {
      columns.fill(pair);
      readGains();
      reading[LARGEST_GAIN] = gains[LARGEST];
      reading[SMALLEST_GAIN] = gains[SMALLEST];
      reading[ICN] = gains[LARGEST] > 0 ? gains[SMALLEST] / gains[LARGEST] : 0;
    },
    readSpeeds() {
      readZonotope();
      reading[MAXIMUM_SPEED] = speeds[0];
      reading[SURE_SPEED] = reading[ICN] > FLAT ? speeds[1] : 0;
    },
  };
}

function heldGauge(branches: BranchPairs, maxSpeed: Float64Array): SixAxisGauge {
  const reading = new Float64Array(5);
  const inverse = new Float64Array(2);
  const speeds = new Float64Array(2);
  const rows = new Float64Array(18);
  const fill = makeHeldRows(branches, maxSpeed, rows);
  const readInverse = makeExtremeGains(rows, inverse);
  const readSlabs = makeSlabSpeeds(rows, speeds);
  return {
    branches,
    reading,
    read(pair) {
      fill(pair);
      readInverse();
      reading[LARGEST_GAIN] = 1 / inverse[SMALLEST];
      reading[SMALLEST_GAIN] = 1 / inverse[LARGEST];
      reading[ICN] = inverse[SMALLEST] / inverse[LARGEST];
    },
    readSpeeds() {
      readSlabs();
      reading[MAXIMUM_SPEED] = speeds[0];
      reading[SURE_SPEED] = speeds[1];
    },
  };
}

/** Inverse condition number of the whole scaled Jacobian, angular rows times a characteristic length (m), into `reading`. */
export interface PoseConditionGauge {
  readonly branches: BranchPairs;
  readonly reading: Float64Array;
  read(pair: number): void;
  /** Of the translational block, for the pair last read. */
  readTranslational(): void;
  readSpeeds(): void;
}

/**
 * The full matrix beside its translational block. `reading` holds the full matrix's ratio at ICN; `readTranslational` fills the gains, and
 * the translational ratio at TRANSLATIONAL_ICN.
 */
export const TRANSLATIONAL_ICN = 5;

export function makePoseConditionGauge(chain: Chain, lengthM: number, lastIsFree: boolean): PoseConditionGauge | null {
  const branches = makeBranchPairs(chain, lastIsFree);
  if (!branches) return null;
  const reading = new Float64Array(6);
  const extremes = new Float64Array(2);
  const matrix = new Float64Array(36);
  const columns = makeToolColumns(branches, chain.maxSpeed);
  const { linear, angular } = columns;
  const readMatrix = makeMatrixExtremes(matrix, extremes);
  const gains = new Float64Array(2);
  const speeds = new Float64Array(2);
  const readGains = makeExtremeGains(linear, gains);
  const readZonotope = makeZonotopeSpeeds(linear, speeds);
  return {
    branches,
    reading,
    read(pair) {
      columns.fill(pair);
      for (let i = 0; i < 6; i++)
        for (let r = 0; r < 3; r++) {
          matrix[6 * i + r] = linear[3 * i + r];
          matrix[6 * i + r + 3] = lengthM * angular[3 * i + r];
        }
      readMatrix();
      reading[ICN] = extremes[0] > 0 ? extremes[1] / extremes[0] : 0;
    },
    readTranslational() {
      readGains();
      reading[LARGEST_GAIN] = gains[LARGEST];
      reading[SMALLEST_GAIN] = gains[SMALLEST];
      reading[TRANSLATIONAL_ICN] = gains[SMALLEST] / gains[LARGEST];
    },
    readSpeeds() {
      readZonotope();
      reading[MAXIMUM_SPEED] = speeds[0];
      reading[SURE_SPEED] = speeds[1];
    },
  };
}
