import { compileChain, forward, makeStance } from '@/lib/kinematics/chain';
import { makeMapComputer } from '@/lib/kinematics/maps/compute-tile';
import { reach } from '@/lib/kinematics/reach';
import { makeSolver } from '@/lib/kinematics/solver';
import type { Arm } from '@/lib/kinematics/types';
import { armHeightsMm } from './arm-reach';
import { reachRadius } from './reach-radius';

/** A vertical cut through an arm's first axis: mm, x away from the axis, z up from the base. */

export type SectionPoint = readonly [xMm: number, zMm: number];

export interface SectionPosture {
  /** Actuator values (rad, m). */
  readonly values: readonly number[];
  /** From the base along the joint axes to the tool point; points that fall together are given once. */
  readonly body: readonly SectionPoint[];
  /** Where each joint lies that moves within the cut, with its number counted from one. */
  readonly joints: readonly { readonly number: number; readonly at: SectionPoint }[];
}

/** Where a posture is looked for that shows the arm at work: shares of its reach (out, up) with the tool straight down. */
const SPOTS = [
  [0.7, 0.25],
  [0.6, 0.1],
  [0.7, 0.05],
  [0.8, -0.1],
] as const;

function workingPosture(arm: Arm, reachM: number): ArrayLike<number> {
  const solver = makeSolver(arm);
  // A quill works high above the floor: half its stroke down, beside its column.
  const { topMm, bottomMm } = armHeightsMm(arm);
  const middle = (topMm + bottomMm) / 2000 / reachM;
  for (const [out, up] of [...SPOTS, [0.7, middle], [0.5, middle]]) {
    const position = [out * reachM, 0, up * reachM] as const;
    const answer = reach(solver, { position, direction: [0, 0, -1], roll: 'free' });
    const [first] = answer.postures;
    if (first) return first.posture;
  }
  const { min, max, prismatic, coupling } = solver.chain;
  // Slides stand off their middle, or a gantry would hide behind its own base.
  const share = (index: number): number => (!coupling && prismatic[index] ? 0.75 : 0.5);
  return min.map((value, index) => value + share(index) * (max[index] - value));
}

const TOGETHER_MM = 1;

/** The arm in a posture with the tool pointing down, or resting where it cannot point down. */
export function sectionPosture(arm: Arm, reachMm: number): SectionPosture {
  const chain = compileChain(arm);
  const values = Array.from(workingPosture(arm, reachMm / 1000));
  const { origins, axes, tool, joints: posture } = forward(chain, values, makeStance(chain));
  const body: SectionPoint[] = [[1000 * chain.base[3], 1000 * chain.base[11]]];
  const joints: { number: number; at: SectionPoint }[] = [];
  const add = (at: SectionPoint): void => {
    const last = body[body.length - 1];
    if (Math.hypot(at[0] - last[0], at[1] - last[1]) > TOGETHER_MM) body.push(at);
  };
  for (let joint = 0; joint < chain.joints; joint++) {
    const at: SectionPoint = [1000 * origins[3 * joint], 1000 * origins[3 * joint + 2]];
    add(at);
    // Up along the joint's own axis first, then across to the next one: a column stands and a shoulder reaches out.
    const along = 1000 * (chain.d[joint] + (chain.prismatic[joint] ? posture[joint] : 0));
    add([at[0] + along * axes[3 * joint], at[1] + along * axes[3 * joint + 2]]);
    // An axis that stands across the cut turns the arm within it.
    const isAcross = Math.abs(axes[3 * joint + 1]) > 0.9;
    if (isAcross && !chain.prismatic[joint]) joints.push({ number: joint + 1, at });
  }
  add([1000 * tool[3], 1000 * tool[11]]);
  return { values, body, joints };
}

/** Rows and columns of a section map: `origin` is the centre of the first cell (lowest, left), all in mm. */
export interface SectionGrid {
  readonly originXMm: number;
  readonly originZMm: number;
  readonly stepMm: number;
  readonly columns: number;
  readonly rows: number;
}

/** A grid round everything that the arm may reach in the cut, and a little behind its first axis; `cellsOut` from there to the reach. */
export function sectionGrid(arm: Arm, reachMm: number, cellsOut: number): SectionGrid {
  const stepMm = reachMm / cellsOut;
  const { topMm, bottomMm } = armHeightsMm(arm);
  // Held down, the tool ends below the wrist centre by what lies between the two.
  const toolMm = Math.min(0.4 * reachMm, Math.max(0, 1000 * reachRadius(arm) - reachMm));
  const top = Math.max(topMm, 0.5 * reachMm) + 0.08 * reachMm;
  const bottom = Math.max(Math.min(0, bottomMm - toolMm), -0.4 * reachMm) - 0.08 * reachMm;
  const [left, right] = [-0.42 * reachMm, 1.38 * reachMm];
  // Whole cells either way from the axis and the base, so that coarse and fine cells share their edges.
  const cells = (mm: number): number => 4 * Math.ceil(Math.abs(mm) / stepMm / 4);
  return {
    originXMm: (0.5 - cells(left)) * stepMm,
    originZMm: (0.5 - cells(bottom)) * stepMm,
    stepMm,
    columns: cells(left) + cells(right),
    rows: cells(bottom) + cells(top),
  };
}

/** The same place in cells four times as large. */
export function coarsened({ originXMm, originZMm, stepMm, columns, rows }: SectionGrid): SectionGrid {
  return {
    originXMm: originXMm + 1.5 * stepMm,
    originZMm: originZMm + 1.5 * stepMm,
    stepMm: 4 * stepMm,
    columns: columns / 4,
    rows: rows / 4,
  };
}

export interface SectionRow {
  /** NaN where the tool does not reach. */
  readonly inverseConditionNumber: Float32Array;
  /** m/s. */
  readonly maximumToolSpeed: Float32Array;
}

/** One row of the cut with the tool down and the wrist held. */
export function sectionRow(arm: Arm, grid: SectionGrid, row: number): SectionRow {
  const computer = makeMapComputer(arm, {
    grid: { origin: [grid.originXMm / 1000, 0], step: grid.stepMm / 1000, columns: grid.columns, rows: 1 },
    toolHeight: (grid.originZMm + row * grid.stepMm) / 1000,
    direction: { kind: 'down' },
    roll: 'free',
    wrist: 'held',
    branch: 'best',
  });
  return computer.tile(0, 1);
}
