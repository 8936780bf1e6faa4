import type { Fixture, Item } from '../items';
import { taskPointSchema } from '../items';
import { onFloor, type FloorTaskPoint } from '../task-points';
import type { CellVerdicts } from './cell-judge';
import { floorToItem } from '../geometry';
import { patternPlace } from './places';

/**
 * The place of a path or a pattern that is worth looking at, as a task point: the weakest place of a path, the worst of a pattern. Null
 * where no path or pattern has this id.
 */
export function placeOfTask(
  items: readonly Item[],
  { paths, patterns }: CellVerdicts,
  taskId: string,
): FloorTaskPoint | null {
  for (const fixture of items) {
    if (fixture.kind !== 'fixture') continue;
    const pattern = fixture.taskPatterns.find(({ id }) => id === taskId);
    if (pattern) {
      const worst =
        patterns.find(({ patternId }) => patternId === taskId)?.best?.worst.place ?? patternPlace(pattern, 1);
      return asPoint(fixture, { ...pattern, xMm: worst.xMm, yMm: worst.yMm, zMm: worst.zMm });
    }
    const path = fixture.taskPaths.find(({ id }) => id === taskId);
    if (!path) continue;
    const weakest = paths.find(({ pathId }) => pathId === taskId)?.best?.weakest?.positionMm;
    const [xMm, yMm] = weakest
      ? floorToItem(fixture, [weakest[0], weakest[1]])
      : [path.points[0].xMm, path.points[0].yMm];
    return asPoint(fixture, { ...path, xMm, yMm, zMm: weakest?.[2] ?? path.points[0].zMm });
  }
  return null;
}

/** Only what a task point has is taken over. */
const asPoint = (fixture: Fixture, place: object): FloorTaskPoint => onFloor(fixture, taskPointSchema.parse(place));
