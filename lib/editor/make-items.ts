import {
  itemSchema,
  taskPointSchema,
  type Fixture,
  type Item,
  type ItemKind,
  type TaskPoint,
} from '@/lib/layout/items';
import { rectangleOutline, type PointMm } from '@/lib/layout/geometry';
import type { Items } from './changes';
import { lastPlace } from './order';

/** The words of each kind, as the lists, the palette and the announcements say them. */
export const KIND_WORDS: Record<ItemKind, string> = {
  robot: 'Robot',
  fixture: 'Fixture',
  obstacle: 'Obstacle',
  guardLine: 'Guard line',
  walkway: 'Walkway',
  dimension: 'Dimension',
};

/** Sizes that a click places; all of them can be typed afterwards. */
const FIXTURE_MM = { width: 1000, depth: 700, height: 850 };
const OBSTACLE_MM = { width: 500, depth: 500, height: 2500 };
export const WALKWAY_WIDTH_MM = 1200;

/** A free name: R1, R2, … for robots; Fixture A, B, … for fixtures; the kind and a number for the rest. */
export function freeName(items: Items, kind: ItemKind): string {
  const taken = new Set([...items.values()].map(({ name }) => name));
  for (let count = 1; ; count += 1) {
    const name = numbered(kind, count);
    if (!taken.has(name)) return name;
  }
}

function numbered(kind: ItemKind, count: number): string {
  if (kind === 'robot') return `R${count}`;
  if (kind === 'fixture' && count <= 26) return `Fixture ${String.fromCharCode(64 + count)}`;
  return `${KIND_WORDS[kind]} ${count}`;
}

/** What a tool has to know to put a new item on the floor. */
export interface NewItem {
  readonly id: string;
  readonly xMm: number;
  readonly yMm: number;
}

const common = (items: Items, kind: ItemKind, { id, xMm, yMm }: NewItem) => ({
  kind,
  id,
  name: freeName(items, kind),
  xMm,
  yMm,
  angleDeg: 0,
  order: lastPlace(items),
});

export function newRobot(items: Items, at: NewItem, armId: string): Item {
  return itemSchema.parse({ ...common(items, 'robot', at), armId });
}

/** A rectangular fixture or obstacle about its place. */
export function newBlock(
  items: Items,
  kind: 'fixture' | 'obstacle',
  at: NewItem,
  sizeMm?: { width: number; depth: number },
): Item {
  const usual = kind === 'fixture' ? FIXTURE_MM : OBSTACLE_MM;
  const { width, depth } = sizeMm ?? usual;
  return itemSchema.parse({
    ...common(items, kind, at),
    outlineMm: rectangleOutline(width, depth),
    zFromMm: 0,
    zToMm: usual.height,
  });
}

/** A guard line or walkway through points of the floor. Its place is the first point, so the others are offsets from it. */
export function newLine(
  items: Items,
  kind: 'guardLine' | 'walkway',
  id: string,
  floorPoints: readonly PointMm[],
  closed: boolean,
): Item {
  const [xMm, yMm] = floorPoints[0];
  const pointsMm = floorPoints.map(([x, y]): [number, number] => [x - xMm, y - yMm]);
  const own = kind === 'guardLine' ? { closed } : { widthMm: WALKWAY_WIDTH_MM };
  return itemSchema.parse({ ...common(items, kind, { id, xMm, yMm }), pointsMm, ...own });
}

export function newDimension(items: Items, id: string, from: PointMm, to: PointMm, offsetMm: number): Item {
  const [xMm, yMm] = from;
  return itemSchema.parse({
    ...common(items, 'dimension', { id, xMm, yMm }),
    fromMm: [0, 0],
    toMm: [to[0] - xMm, to[1] - yMm],
    offsetMm,
  });
}

/** A task point in its fixture's frame, tool straight down, on top of the fixture. */
export function newTaskPoint(fixture: Fixture, id: string, [xMm, yMm]: PointMm): TaskPoint {
  const taken = new Set(fixture.taskPoints.map(({ name }) => name));
  let count = fixture.taskPoints.length + 1;
  while (taken.has(`${fixture.name} ${count}`)) count += 1;
  const order = fixture.taskPoints.reduce((last, point) => Math.max(last, point.order + 1), 0);
  return taskPointSchema.parse({
    id,
    name: `${fixture.name} ${count}`.slice(-80),
    xMm,
    yMm,
    zMm: fixture.zToMm,
    order,
  });
}
