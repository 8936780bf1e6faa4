import { makePoseConditioner } from '@/lib/kinematics/measures/pose-condition';
import { makeSolver, type SolutionMethod, type Solver } from '@/lib/kinematics/solver';
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
      /** Characteristic length that weighs turning against moving best in that posture (mm); null where there is none. */
      readonly weighingLengthMm: number | null;
    }
  /** The whole cut in large cells, then the next row in small ones (from the lowest); inverse condition number. */
  | { readonly kind: 'coarse'; readonly grid: SectionGrid; readonly rows: readonly Float32Array[] }
  | { readonly kind: 'row'; readonly values: Float32Array }
  | { readonly kind: 'done'; readonly fastestMPerS: number | null };

/** Cells from the first axis to the reach; fewer where every posture has to be searched for. */
const CELLS_OUT = 72;
const CELLS_OUT_SEARCHED = 36;
const SEARCHED: readonly SolutionMethod[] = ['numerical', 'arm angle', 'track'];

/** Below this inverse condition number a posture is as good as singular at any length. */
const SINGULAR = 1e-6;

function weighingLength({ chain, freedoms, stand }: Solver, posture: readonly number[]): number | null {
  // Freedoms from the fourth on are turns.
  if (!freedoms.some((row) => row < 3) || !freedoms.some((row) => row >= 3)) return null;
  const { lengthM, inverseConditionNumber } = makePoseConditioner(chain, freedoms)(stand(posture));
  return inverseConditionNumber > SINGULAR ? 1000 * lengthM : null;
}

/** Yields null for a breath inside longer work. Ends after `facts` for a chain that reaches nowhere. */
export function* studyArm(arm: Arm): Generator<StudyStep | null, void> {
  const chain = sayChain(arm);
  const reachMm = armReachMm(arm);
  yield null;
  const solver = makeSolver(arm);
  const cells = SEARCHED.includes(solver.method) ? CELLS_OUT_SEARCHED : CELLS_OUT;
  const grid = sectionGrid(arm, Math.max(1, reachMm), cells);
  const posture = sectionPosture(arm, Math.max(1, reachMm));
  const weighingLengthMm = weighingLength(solver, posture.values);
  yield { kind: 'facts', reachMm, chain, grid, posture, weighingLengthMm };
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
