import type { Chain } from '../chain';
import type { Measures, WristMode } from '../types';
import { speedAlongFlat } from './flat-speed';
import { nullSpace } from './null-space';
import { singularValues } from './singular-values';
import {
  makeBoundCorners,
  makeCrossNormals,
  makeFacetNormals,
  makeSignCorners,
  type Corners,
  type FacetNormals,
  type VelocitySet,
} from './velocity-set';

/** Below this share of the largest gain the set counts as flat: no ball fits inside. */
const FLAT = 1e-14;

/** One reading, in fields that the next reading overwrites. Speeds in m/s. */
export interface Reading {
  readonly gains: Float64Array;
  inverseConditionNumber: number;
  manipulability: number;
  ellipsoidSpeed: number;
  maximumToolSpeed: number;
  sureSpeed: number;
  /** Zero-based actuator whose limit the sure speed runs into; −1 where no single one does. */
  bindingActuator: number;
}

/**
 * Measures velocities of one chain in one wrist mode, posture by posture, without allocating. `set` is the velocity set of the last
 * posture read.
 */
export interface Gauge {
  readonly mode: WristMode;
  /** Rows of the Jacobian that carry the linear freedoms measured, for instance 0 1 2. */
  readonly linearRows: readonly number[];
  readonly reading: Reading;
  /** `jacobian`: 6 × actuators, row after row, unscaled. */
  read(jacobian: Float64Array): Reading;
  /** The gains and the inverse condition number alone, for choosing among many postures; the other fields keep what they were. */
  readGains(jacobian: Float64Array): Reading;
  /** The velocity set of the posture last read, and its corners (one of each ± pair) as m numbers each. */
  velocitySet(): VelocitySet;
  corners(): Float64Array;
  /**
   * Speed that the posture last read can make along a direction without sideways drift: the largest t with t·d in the velocity set (m/s).
   * `direction` has an entry for each of `linearRows`, any length above zero. Exact for flat sets too, where most directions have none.
   */
  speedAlong(direction: ArrayLike<number>): number;
}

/**
 * `freedoms`: rows of the Jacobian that the chain controls. Wrist free uses the linear ones alone; wrist held asks zero angular velocity of
 * the angular ones (Salisbury & Craig 1982; Klein & Blaho 1987; Yoshikawa 1985).
 */
export function makeGauge(chain: Chain, freedoms: readonly number[], mode: WristMode): Gauge {
  const n = chain.actuators;
  const linearRows = freedoms.filter((row) => row < 3);
  const heldRows = mode === 'held' ? freedoms.filter((row) => row >= 3) : [];
  const m = linearRows.length;
  const measuredRows = [...linearRows, ...heldRows];

  const unscaled = new Float64Array(measuredRows.length * n);
  const linear = new Float64Array(m * n);
  const angular = new Float64Array(Math.max(1, heldRows.length) * n);
  const basis = new Float64Array(n * n);
  const scratch = new Float64Array(n * n);
  const turned = new Float64Array(Math.max(measuredRows.length, 1) * n);
  const values = new Float64Array(Math.max(measuredRows.length, 1));
  // One toolbox for each dimension that the null space can have; singular postures have a larger one than others.
  const toolboxes = new Map<number, Toolbox>();
  const toolbox = (k: number): Toolbox => {
    let found = toolboxes.get(k);
    if (!found) toolboxes.set(k, (found = makeToolbox(m, k, n, heldRows.length === 0)));
    return found;
  };
  const reading: Reading = {
    gains: new Float64Array(m),
    inverseConditionNumber: 0,
    manipulability: 0,
    ellipsoidSpeed: 0,
    maximumToolSpeed: 0,
    sureSpeed: 0,
    bindingActuator: -1,
  };
  let current = toolbox(heldRows.length === 0 ? n : Math.max(0, n - heldRows.length));

  function read(jacobian: Float64Array): Reading {
    measuredRows.forEach((row, index) => {
      for (let i = 0; i < n; i++) unscaled[index * n + i] = jacobian[row * n + i];
    });
    readGains(jacobian);
    readManipulability();
    readSpeeds();
    return reading;
  }

  function readGains(jacobian: Float64Array): Reading {
    for (let r = 0; r < m; r++)
      for (let i = 0; i < n; i++) linear[r * n + i] = jacobian[linearRows[r] * n + i] * chain.maxSpeed[i];
    current = heldRows.length === 0 ? freeSet() : heldSet(jacobian);
    measureGains();
    return reading;
  }

  function freeSet(): Toolbox {
    const box = toolbox(n);
    box.set.map.set(linear);
    return box;
  }

  function heldSet(jacobian: Float64Array): Toolbox {
    for (let r = 0; r < heldRows.length; r++)
      for (let i = 0; i < n; i++) angular[r * n + i] = jacobian[heldRows[r] * n + i] * chain.maxSpeed[i];
    const k = nullSpace(angular, heldRows.length, n, basis, scratch);
    const box = toolbox(k);
    for (let i = 0; i < n; i++) for (let j = 0; j < k; j++) box.set.bounds[i * k + j] = basis[j * n + i];
    for (let r = 0; r < m; r++)
      for (let j = 0; j < k; j++) {
        let sum = 0;
        for (let i = 0; i < n; i++) sum += linear[r * n + i] * basis[j * n + i];
        box.set.map[r * k + j] = sum;
      }
    return box;
  }

  function measureGains() {
    const { map, coordinates: k } = current.set;
    for (let i = 0; i < m * k; i++) turned[i] = map[i];
    if (k === 0) reading.gains.fill(0);
    else singularValues(turned, m, k, reading.gains);
    const largest = reading.gains[0];
    reading.ellipsoidSpeed = largest;
    reading.inverseConditionNumber = largest > 0 ? reading.gains[m - 1] / largest : 0;
  }

  function readManipulability() {
    const rows = measuredRows.length;
    for (let i = 0; i < rows * n; i++) turned[i] = unscaled[i];
    singularValues(turned, rows, n, values);
    let product = 1;
    for (let i = 0; i < rows; i++) product *= values[i];
    reading.manipulability = product;
  }

  function readSpeeds() {
    const { set, corners, normals } = current;
    const count = (current.cornerCount = corners.find(set));
    let farthest = 0;
    for (let c = 0; c < count; c++) {
      let sum = 0;
      for (let r = 0; r < m; r++) sum += corners.points[c * m + r] ** 2;
      if (sum > farthest) farthest = sum;
    }
    reading.maximumToolSpeed = Math.sqrt(farthest);
    reading.bindingActuator = -1;
    if (set.coordinates < m || reading.gains[m - 1] <= FLAT * reading.gains[0]) {
      reading.sureSpeed = 0;
      return;
    }
    current.least = Infinity;
    current.leastActuator = -1;
    normals(set, current.visit);
    reading.sureSpeed = Number.isFinite(current.least) ? current.least : 0;
    reading.bindingActuator = current.leastActuator;
  }

  function speedAlong(direction: ArrayLike<number>): number {
    if (reading.sureSpeed === 0) return speedAlongFlat(current.set, direction);
    let size = 0;
    for (let r = 0; r < m; r++) size += direction[r] * direction[r];
    size = Math.sqrt(size);
    let least = Infinity;
    current.normals(current.set, (normal) => {
      let along = 0;
      for (let r = 0; r < m; r++) along += normal[r] * direction[r];
      if (along !== 0) least = Math.min(least, current.support(normal) / Math.abs(along / size));
    });
    return least;
  }

  return {
    mode,
    linearRows,
    reading,
    read,
    readGains,
    speedAlong,
    velocitySet: () => current.set,
    corners: () => current.corners.points.subarray(0, current.cornerCount * m),
  };
}

interface Toolbox {
  readonly set: VelocitySet;
  readonly corners: Corners;
  readonly normals: FacetNormals;
  /** How far the set reaches along a unit vector. */
  readonly support: (normal: Float64Array) => number;
  readonly visit: (normal: Float64Array, actuator: number) => void;
  cornerCount: number;
  least: number;
  leastActuator: number;
}

function makeToolbox(m: number, k: number, n: number, free: boolean): Toolbox {
  const bounds = new Float64Array(n * k);
  if (free) for (let i = 0; i < n; i++) bounds[i * k + i] = 1;
  const set: VelocitySet = { map: new Float64Array(m * k), bounds, dimensions: m, coordinates: k, actuators: n };
  const corners = free ? makeSignCorners(m, n) : makeBoundCorners(m, k, n);
  const normals = free && m === 3 ? makeCrossNormals(n) : makeFacetNormals(m, k, n);
  const support = free
    ? (normal: Float64Array) => {
        let sum = 0;
        for (let i = 0; i < n; i++) {
          let dot = 0;
          for (let r = 0; r < m; r++) dot += normal[r] * set.map[r * n + i];
          sum += Math.abs(dot);
        }
        return sum;
      }
    : (normal: Float64Array) => {
        let most = 0;
        for (let c = 0; c < box.cornerCount; c++) {
          let dot = 0;
          for (let r = 0; r < m; r++) dot += normal[r] * corners.points[c * m + r];
          most = Math.max(most, Math.abs(dot));
        }
        return most;
      };
  const box: Toolbox = {
    set,
    corners,
    normals,
    support,
    visit: (normal, actuator) => {
      const distance = support(normal);
      if (distance < box.least) {
        box.least = distance;
        box.leastActuator = actuator;
      }
    },
    cornerCount: 0,
    least: Infinity,
    leastActuator: -1,
  };
  return box;
}

/** A reading as it leaves the kernel. */
export function measuresOf(reading: Reading): Measures {
  return {
    gains: Array.from(reading.gains),
    inverseConditionNumber: reading.inverseConditionNumber,
    manipulability: reading.manipulability,
    ellipsoidSpeed: reading.ellipsoidSpeed,
    maximumToolSpeed: reading.maximumToolSpeed,
    sureSpeed: reading.sureSpeed,
  };
}

/** A chain without a linear freedom has no tool speed to measure. */
export const NO_MEASURES: Measures = {
  gains: null,
  inverseConditionNumber: null,
  manipulability: null,
  ellipsoidSpeed: null,
  maximumToolSpeed: null,
  sureSpeed: null,
};
