import { makeSolver } from '@/lib/kinematics/solver';
import type { Arm } from '@/lib/kinematics/types';
import { armReachMm } from './arm-reach';
import {
  coarsened,
  sectionGrid,
  sectionPosture,
  sectionRow,
  type SectionGrid,
  type SectionPosture,
} from './arm-section';
import { sayChain } from './chain-words';

/** What the page of an arm shows beside its table, worked out bit by bit so that whoever computes it can stop in between. */
export type StudyStep =
  | {
      readonly kind: 'facts';
      readonly reachMm: number;
      readonly chain: { readonly method: string; readonly controls: string };
      readonly grid: SectionGrid;
      readonly posture: SectionPosture;
    }
  /** The whole cut in large cells, then the next row in small ones (from the lowest); inverse condition number. */
  | { readonly kind: 'coarse'; readonly grid: SectionGrid; readonly rows: readonly Float32Array[] }
  | { readonly kind: 'row'; readonly values: Float32Array }
  | { readonly kind: 'done'; readonly fastestMPerS: number | null };

/** Cells from the first axis to the reach; fewer where every posture has to be searched for. */
const CELLS_OUT = 72;
const CELLS_OUT_SEARCHED = 36;

/** Yields null for a breath inside longer work. Ends after `facts` for a chain that reaches nowhere. */
export function* studyArm(arm: Arm): Generator<StudyStep | null, void> {
  const chain = sayChain(arm);
  const reachMm = armReachMm(arm);
  yield null;
  const cells = makeSolver(arm).method === 'numerical' ? CELLS_OUT_SEARCHED : CELLS_OUT;
  const grid = sectionGrid(arm, Math.max(1, reachMm), cells);
  yield { kind: 'facts', reachMm, chain, grid, posture: sectionPosture(arm, Math.max(1, reachMm)) };
  if (reachMm < 1) return;
  const large = coarsened(grid);
  const coarse: Float32Array[] = [];
  for (let row = 0; row < large.rows; row++) {
    coarse.push(sectionRow(arm, large, row).inverseConditionNumber);
    yield null;
  }
  yield { kind: 'coarse', grid: large, rows: coarse };
  let fastest = -Infinity;
  for (let row = 0; row < grid.rows; row++) {
    const { inverseConditionNumber, maximumToolSpeed } = sectionRow(arm, grid, row);
    // NaN, where nothing is reached, is never above.
    for (const speed of maximumToolSpeed) if (speed > fastest) fastest = speed;
    yield { kind: 'row', values: inverseConditionNumber };
  }
  yield { kind: 'done', fastestMPerS: fastest > 0 ? fastest : null };
}
