import type { Fixture, PathCorner, TaskPath, TaskPattern } from '@/lib/layout/items';
import { taskPathSchema, taskPatternSchema } from '@/lib/layout/items';
import { edited, type Edit } from './edits';
import { tidy } from './snapping';

/** Whether a task point, path or pattern of this id is on the fixture. */
export function hasTask({ taskPoints, taskPaths, taskPatterns }: Fixture, id: string): boolean {
  return [taskPoints, taskPaths, taskPatterns].some((list) => list.some((task) => task.id === id));
}

const WORK_OVER_TOP_MM = 30;

function nextName(fixture: Fixture, word: string, taken: readonly { readonly name: string }[]): string {
  const names = new Set(taken.map(({ name }) => name));
  let count = taken.length + 1;
  while (names.has(`${fixture.name} ${word} ${count}`)) count += 1;
  return `${fixture.name} ${word} ${count}`.slice(-80);
}

const lastOrder = ({ taskPoints, taskPaths, taskPatterns }: Fixture): number =>
  [...taskPoints, ...taskPaths, ...taskPatterns].reduce((last, { order }) => Math.max(last, order + 1), 0);

/** A straight path across the middle of the fixture, a little over its top. */
export function newTaskPath(fixture: Fixture, id: string): TaskPath {
  const zMm = fixture.zToMm + WORK_OVER_TOP_MM;
  return taskPathSchema.parse({
    id,
    name: nextName(fixture, 'seam', fixture.taskPaths),
    points: [
      { xMm: -100, yMm: 0, zMm },
      { xMm: 100, yMm: 0, zMm },
    ],
    order: Math.min(10_000, lastOrder(fixture)),
  });
}

/** Two rows of three about the middle of the fixture, a little over its top. */
export function newTaskPattern(fixture: Fixture, id: string): TaskPattern {
  return taskPatternSchema.parse({
    id,
    name: nextName(fixture, 'places', fixture.taskPatterns),
    xMm: -100,
    yMm: -50,
    zMm: fixture.zToMm + WORK_OVER_TOP_MM,
    rows: 2,
    columns: 3,
    order: Math.min(10_000, lastOrder(fixture)),
  });
}

export function editedTaskPath(fixture: Fixture, pathId: string, patch: Partial<TaskPath>): Edit<Fixture> {
  const taskPaths = fixture.taskPaths.map((path) => (path.id === pathId ? { ...path, ...patch } : path));
  return edited(fixture, { taskPaths });
}

export function editedTaskPattern(fixture: Fixture, patternId: string, patch: Partial<TaskPattern>): Edit<Fixture> {
  const taskPatterns = fixture.taskPatterns.map((pattern) =>
    pattern.id === patternId ? { ...pattern, ...patch } : pattern,
  );
  return edited(fixture, { taskPatterns });
}

/** A path without one corner; the way into the corner after it becomes straight. A path keeps two corners. */
export function withoutCorner(points: readonly PathCorner[], index: number): PathCorner[] {
  return points
    .filter((_, at) => at !== index)
    .map((corner, at) => (at === index || at === 0 ? { ...corner, arcVia: null } : corner));
}

/** A corner after this one: halfway to the next, or as far on as the last stretch is long. */
export function withCornerAfter(points: readonly PathCorner[], index: number): PathCorner[] {
  const at = points[index];
  const next = points[index + 1];
  const before = points[index - 1] ?? at;
  const mixed = (key: 'xMm' | 'yMm' | 'zMm'): number =>
    tidy(next ? (at[key] + next[key]) / 2 : 2 * at[key] - before[key]);
  const corner: PathCorner = { xMm: mixed('xMm'), yMm: mixed('yMm'), zMm: mixed('zMm'), arcVia: null };
  return [
    ...points.slice(0, index + 1),
    corner,
    ...points.slice(index + 1).map((later, k) => (k === 0 ? { ...later, arcVia: null } : later)),
  ];
}

/** Bows the way into a corner: by way of a point that stands off its middle by a quarter of its length, to its left; or straightens it. */
export function withBow(points: readonly PathCorner[], index: number, bowed: boolean): PathCorner[] {
  return points.map((corner, at): PathCorner => {
    if (at !== index || index === 0) return corner;
    if (!bowed) return { ...corner, arcVia: null };
    const from = points[index - 1];
    const [dx, dy] = [corner.xMm - from.xMm, corner.yMm - from.yMm];
    const middle = (key: 'xMm' | 'yMm' | 'zMm'): number => (from[key] + corner[key]) / 2;
    const upright = dx === 0 && dy === 0;
    return {
      ...corner,
      arcVia: {
        xMm: tidy(middle('xMm') + (upright ? Math.abs(corner.zMm - from.zMm) / 4 : -dy / 4)),
        yMm: tidy(middle('yMm') + dx / 4),
        zMm: tidy(middle('zMm')),
      },
    };
  });
}
