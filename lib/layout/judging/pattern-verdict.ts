import type { Bench } from '../bench';
import type { Fixture, TaskPattern } from '../items';
import { poseOnFloor, targetInBase } from '../task-points';
import type { VerdictBand } from '../verdict-words';
import type { Assignment } from './assignment';
import { patternPlaces, type PatternPlace } from './places';
import { judgeTarget, worthOfVerdict, type RobotVerdict } from './point-verdict';

/** How one robot does at all places of a pattern. */
export interface RobotPatternVerdict {
  readonly robotId: string;
  /** All places reached, and all met. */
  readonly reached: boolean;
  readonly met: boolean;
  readonly reachedPlaces: number;
  readonly metPlaces: number;
  readonly worst: { readonly place: PatternPlace; readonly verdict: RobotVerdict };
  /** By place. */
  readonly bands: readonly VerdictBand[];
}

export interface PatternVerdict {
  readonly patternId: string;
  readonly patternName: string;
  readonly fixtureId: string;
  readonly fixtureName: string;
  readonly placeCount: number;
  readonly wantedSpeedMmS: number | null;
  readonly assignment: Assignment;
  readonly best: RobotPatternVerdict | null;
  readonly robots: readonly RobotPatternVerdict[];
}

export function judgePattern(bench: Bench, fixture: Fixture, pattern: TaskPattern): RobotPatternVerdict {
  let worst: RobotPatternVerdict['worst'] | null = null;
  const bands: VerdictBand[] = [];
  let reachedPlaces = 0;
  let metPlaces = 0;
  for (const place of patternPlaces(pattern)) {
    const pose = poseOnFloor(fixture, { ...pattern, xMm: place.xMm, yMm: place.yMm, zMm: place.zMm });
    const verdict = judgeTarget(bench, targetInBase({ rollDeg: pattern.rollDeg, pose }, bench.robot), pattern.speedMmS);
    bands.push(verdict.band);
    if (verdict.reached) reachedPlaces += 1;
    if (verdict.met) metPlaces += 1;
    if (!worst || worthOfVerdict(verdict) < worthOfVerdict(worst.verdict)) worst = { place, verdict };
  }
  const count = bands.length;
  return {
    robotId: bench.robot.id,
    reached: reachedPlaces === count,
    met: metPlaces === count,
    reachedPlaces,
    metPlaces,
    // A pattern has at least one place.
    worst: worst!,
    bands,
  };
}

/** The one that meets more places; of equals the one whose worst place is better. */
export function betterPattern(best: RobotPatternVerdict, next: RobotPatternVerdict): RobotPatternVerdict {
  if (next.metPlaces !== best.metPlaces) return next.metPlaces > best.metPlaces ? next : best;
  if (next.reachedPlaces !== best.reachedPlaces) return next.reachedPlaces > best.reachedPlaces ? next : best;
  return worthOfVerdict(next.worst.verdict) > worthOfVerdict(best.worst.verdict) ? next : best;
}
