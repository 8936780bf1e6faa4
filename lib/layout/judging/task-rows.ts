import type { CellVerdicts, PointVerdict } from './cell-judge';
import type { Assignment } from './assignment';
import type { PathVerdict } from './path-verdict';
import type { PatternVerdict } from './pattern-verdict';
import { limitDistanceWords, type VerdictBand } from '../verdict-words';

/** One task of the sheet in a list of verdicts, whether a point, a path or a pattern. */
export interface TaskRow {
  readonly kind: 'point' | 'path' | 'pattern';
  readonly id: string;
  readonly name: string;
  readonly fixtureId: string;
  readonly assignment: Assignment;
  /** Null on a sheet without robots. */
  readonly robotId: string | null;
  readonly band: VerdictBand | null;
  readonly reached: boolean;
  readonly met: boolean;
  /** At its worst place. */
  readonly inverseConditionNumber: number | null;
  /** Speed in every direction, or along a path, at its slowest. */
  readonly speedMmS: number | null;
  readonly wantedSpeedMmS: number | null;
  readonly marginMmS: number | null;
  readonly reason: string | null;
  readonly notes: readonly string[];
}

/** Every task of a sheet, the worst first: not reached, then too slow, then by conditioning; equals in the order of the work. */
export function taskRows({ points, paths, patterns }: CellVerdicts): TaskRow[] {
  const rows = [...points.map(pointRow), ...paths.map(pathRow), ...patterns.map(patternRow)];
  return rows.sort((one, other) => worth(one) - worth(other));
}

function worth({ band, reached, met, inverseConditionNumber }: TaskRow): number {
  if (band === null) return -4;
  if (!reached) return -3 + (inverseConditionNumber ?? 0);
  return met ? (inverseConditionNumber ?? 0) : (inverseConditionNumber ?? 0) - 1;
}

const goneWords = (assignment: Assignment): string[] =>
  assignment === 'robot gone' ? ['The robot that it was given to is gone; the best one is told instead.'] : [];

function pointRow({ best, ...point }: PointVerdict): TaskRow {
  const { posture } = best ?? { posture: null };
  return {
    kind: 'point',
    id: point.pointId,
    name: point.pointName,
    fixtureId: point.fixtureId,
    assignment: point.assignment,
    robotId: best?.robotId ?? null,
    band: best?.band ?? null,
    reached: best?.reached ?? false,
    met: best?.met ?? false,
    inverseConditionNumber: posture?.inverseConditionNumber ?? null,
    speedMmS: posture?.sureSpeedMmS ?? null,
    wantedSpeedMmS: point.wantedSpeedMmS,
    marginMmS: best?.speedMarginMmS ?? null,
    reason: best?.reason ?? null,
    notes: [
      ...goneWords(point.assignment),
      ...(best?.notes ?? []),
      ...(posture
        ? [
            `Limit margin: joint ${posture.limitJoint}, ${limitDistanceWords(posture.limitDistance, posture.limitSlides)}.`,
          ]
        : []),
    ],
  };
}

function pathRow({ best, ...path }: PathVerdict): TaskRow {
  const weakest = best?.weakest;
  return {
    kind: 'path',
    id: path.pathId,
    name: path.pathName,
    fixtureId: path.fixtureId,
    assignment: path.assignment,
    robotId: best?.robotId ?? null,
    band: best?.band ?? null,
    reached: best?.reached ?? false,
    met: best?.met ?? false,
    inverseConditionNumber: best?.reached ? best.leastInverseConditionNumber : null,
    speedMmS: best?.leastSpeedMmS ?? null,
    wantedSpeedMmS: path.wantedSpeedMmS,
    marginMmS: best?.speedMarginMmS ?? null,
    reason: best?.reason ?? null,
    notes: [
      ...goneWords(path.assignment),
      ...(best?.reached && best.branchKept && best.branch !== '' ? [`One branch throughout: ${best.branch}.`] : []),
      ...(weakest ? [`Weakest stretch: ${Math.round(weakest.fromMm)} to ${Math.round(weakest.toMm)} mm along.`] : []),
    ],
  };
}

function patternRow({ best, ...pattern }: PatternVerdict): TaskRow {
  const worst = best?.worst;
  const posture = worst?.verdict.posture ?? null;
  const { placeCount } = pattern;
  return {
    kind: 'pattern',
    id: pattern.patternId,
    name: pattern.patternName,
    fixtureId: pattern.fixtureId,
    assignment: pattern.assignment,
    robotId: best?.robotId ?? null,
    band: worst?.verdict.band ?? null,
    reached: best?.reached ?? false,
    met: best?.met ?? false,
    inverseConditionNumber: posture?.inverseConditionNumber ?? null,
    speedMmS: posture?.sureSpeedMmS ?? null,
    wantedSpeedMmS: pattern.wantedSpeedMmS,
    marginMmS: worst?.verdict.speedMarginMmS ?? null,
    reason: worst?.verdict.reason ?? null,
    notes: [
      ...goneWords(pattern.assignment),
      ...(best && worst
        ? [
            `Worst of ${placeCount} places: ${placeWords(worst.place)}.`,
            best.metPlaces === placeCount
              ? 'Met at every place.'
              : `Met at ${best.metPlaces}, reached at ${best.reachedPlaces} of ${placeCount}.`,
            ...worst.verdict.notes,
          ]
        : []),
    ],
  };
}

const placeWords = ({
  place,
  row,
  column,
  layer,
}: {
  place: number;
  row: number;
  column: number;
  layer: number;
}): string => `place ${place} (row ${row}, column ${column}, layer ${layer})`;
