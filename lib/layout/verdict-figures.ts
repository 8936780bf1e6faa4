import type { FloorMap } from './floor-map';
import { areaAtOrAboveM2, reachedAreaM2, sharedAreaM2 } from './floor-figures';
import type { PointVerdict } from './verdicts';

/** The numbers by which two variants are compared. */
export interface VerdictFigures {
  readonly points: number;
  /** Reached by some robot, and reached at the wanted speed. */
  readonly reached: number;
  readonly met: number;
  /** Least inverse condition number over the points reached, each at its best robot; null where none is reached. */
  readonly worstInverseConditionNumber: number | null;
  readonly worstPointId: string | null;
  /** Least of sure speed less wanted speed over the reached points that want one, mm/s; null where none does. */
  readonly slowestMarginMmS: number | null;
  readonly slowestPointId: string | null;
}

export function verdictFigures(verdicts: readonly PointVerdict[]): VerdictFigures {
  const best = verdicts.flatMap(({ pointId, best: verdict }) => (verdict ? [{ pointId, verdict }] : []));
  const worst = least(best, ({ verdict }) => verdict.posture?.inverseConditionNumber ?? null);
  const slowest = least(best, ({ verdict }) => verdict.speedMarginMmS);
  return {
    points: verdicts.length,
    reached: best.filter(({ verdict }) => verdict.reached).length,
    met: best.filter(({ verdict }) => verdict.met).length,
    worstInverseConditionNumber: worst?.value ?? null,
    worstPointId: worst?.entry.pointId ?? null,
    slowestMarginMmS: slowest?.value ?? null,
    slowestPointId: slowest?.entry.pointId ?? null,
  };
}

/** The first entry with the least value; entries without one are passed over. */
function least<T>(entries: readonly T[], valueOf: (entry: T) => number | null): { entry: T; value: number } | null {
  let found: { entry: T; value: number } | null = null;
  for (const entry of entries) {
    const value = valueOf(entry);
    if (value !== null && (found === null || value < found.value)) found = { entry, value };
  }
  return found;
}

/** Areas in m². `atOrAboveM2` is null without a threshold. */
export interface FloorFigures {
  readonly reachedM2: number;
  readonly sharedM2: number;
  readonly atOrAboveM2: number | null;
}

export function floorFigures(map: FloorMap, threshold: number | null): FloorFigures {
  return {
    reachedM2: reachedAreaM2(map),
    sharedM2: sharedAreaM2(map),
    atOrAboveM2: threshold === null ? null : areaAtOrAboveM2(map, threshold),
  };
}
