import type { WristMode } from '@/lib/kinematics/types';
import type { Item } from './items';
import { makeCellJudge, type ArmOf, type CellVerdicts, type PointVerdict } from './judging/cell-judge';

export { makeCellJudge, type ArmOf, type CellJudge, type CellVerdicts, type PointVerdict } from './judging/cell-judge';
export type { ReachedPosture, RobotVerdict } from './judging/point-verdict';
export type { PathReading, RobotPathVerdict } from './judging/path-run';
export type { PathVerdict } from './judging/path-verdict';
export type { PatternVerdict, RobotPatternVerdict } from './judging/pattern-verdict';

/** The verdicts on all work of a sheet: task points, paths and patterns. For one look; see makeCellJudge for many. */
export function judgeCell(items: readonly Item[], armOf: ArmOf, wrist: WristMode): CellVerdicts {
  return makeCellJudge()(items, armOf, wrist);
}

/**
 * The verdict on every task point of a sheet, in the order of the work.
 * @param armOf definition of an arm of the library; robots whose arm is not known are left out.
 */
export function judgeItems(items: readonly Item[], armOf: ArmOf, wrist: WristMode): PointVerdict[] {
  const pointsOnly = items.map((item) =>
    item.kind === 'fixture' ? { ...item, taskPaths: [], taskPatterns: [] } : item,
  );
  return [...judgeCell(pointsOnly, armOf, wrist).points];
}
