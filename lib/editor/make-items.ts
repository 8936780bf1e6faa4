import {
  itemSchema,
  taskPointSchema,
  type Dimension,
  type Fixture,
  type Item,
  type ItemKind,
  type TaskPoint,
} from '@/lib/layout/items';
import { floorToItem, rectangleOutline, type PointMm } from '@/lib/layout/geometry';
import type { Items } from './changes';
import { lastPlace } from './order';
import { tidy } from './snapping';

/** The words of each kind, as the lists, the palette and the announcements say them. */
export const KIND_WORDS: Record<ItemKind, string> = {
  robot: 'Robot',
  fixture: 'Fixture',
  obstacle: 'Obstacle',
  guardLine: 'Guard line',
  walkway: 'Walkway',
  conveyor: 'Conveyor',
  dimension: 'Dimension',
  sectionLine: 'Section line',
  note: 'Note',
  zone: 'Zone',
  protectiveDevice: 'Protective device',
};

/** Sizes that a click places; all of them can be typed afterwards. */
const FIXTURE_MM = { width: 1000, depth: 700, height: 850 };
const OBSTACLE_MM = { width: 500, depth: 500, height: 2500 };
export const WALKWAY_WIDTH_MM = 1200;
const COLUMN_MM = { width: 400, depth: 400, height: 4000 };
const CONVEYOR_MM = { widthMm: 600, zFromMm: 600, zToMm: 850 };
const ZONE_MM = { width: 1500, depth: 1000 };
const NOTE_WORDS = 'Write the note here';

/** What an item is called in lists and announcements: a column is an obstacle to the work and a column to its readers. */
export function kindWords(item: Item): string {
  return item.kind === 'obstacle' && item.form === 'column' ? 'Column' : KIND_WORDS[item.kind];
}

/** A free name: R1, R2, … for robots; Fixture A, B, … for fixtures; the kind and a number for the rest. */
export function freeName(items: Items, kind: ItemKind, words = KIND_WORDS[kind]): string {
  const taken = new Set([...items.values()].map(({ name }) => name));
  for (let count = 1; ; count += 1) {
    const name = numbered(kind, count, words);
    if (!taken.has(name)) return name;
  }
}

function numbered(kind: ItemKind, count: number, words: string): string {
  if (kind === 'robot') return `R${count}`;
  if (kind === 'fixture' && count <= 26) return `Fixture ${letterOf(count)}`;
  if (kind === 'sectionLine' && count <= 26) return `Section ${letterOf(count)}–${letterOf(count)}`;
  return `${words} ${count}`;
}

const letterOf = (count: number): string => String.fromCharCode(64 + count);

export type LineKind = 'guardLine' | 'walkway' | 'conveyor' | 'protectiveDevice';

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

/** A square column of the building about its place. */
export function newColumn(items: Items, at: NewItem, sizeMm?: { width: number; depth: number }): Item {
  const { width, depth } = sizeMm ?? COLUMN_MM;
  return itemSchema.parse({
    ...common(items, 'obstacle', at),
    name: freeName(items, 'obstacle', 'Column'),
    form: 'column',
    outlineMm: rectangleOutline(width, depth),
    zToMm: COLUMN_MM.height,
  });
}

/** A zone about its place; no base may stand in it until it is said to be shared. */
export function newZone(items: Items, at: NewItem, sizeMm?: { width: number; depth: number }): Item {
  const { width, depth } = sizeMm ?? ZONE_MM;
  return itemSchema.parse({ ...common(items, 'zone', at), outlineMm: rectangleOutline(width, depth) });
}

export function newNote(items: Items, at: NewItem): Item {
  return itemSchema.parse({ ...common(items, 'note', at), text: NOTE_WORDS });
}

/** A cut from one spot of the floor to another, under the first letter that no other section bears. */
export function newSectionLine(items: Items, id: string, from: PointMm, to: PointMm): Item {
  const [xMm, yMm] = from;
  const taken = new Set([...items.values()].map((item) => (item.kind === 'sectionLine' ? item.letter : '')));
  const letter = [...'ABCDEFGHIJKLMNOPQRSTUVWXYZ'].find((free) => !taken.has(free)) ?? 'Z';
  return itemSchema.parse({
    ...common(items, 'sectionLine', { id, xMm, yMm }),
    letter,
    fromMm: [0, 0],
    toMm: [to[0] - xMm, to[1] - yMm],
  });
}

/** A guard line, walkway or conveyor through points of the floor. Its place is the first point, so the others are offsets from it. */
export function newLine(
  items: Items,
  kind: LineKind,
  id: string,
  floorPoints: readonly PointMm[],
  closed: boolean,
): Item {
  const [xMm, yMm] = floorPoints[0];
  const pointsMm = floorPoints.map(([x, y]): [number, number] => [x - xMm, y - yMm]);
  const own = {
    guardLine: { closed },
    walkway: { widthMm: WALKWAY_WIDTH_MM },
    conveyor: CONVEYOR_MM,
    protectiveDevice: {},
  }[kind];
  return itemSchema.parse({ ...common(items, kind, { id, xMm, yMm }), pointsMm, ...own });
}

/** A spot of the floor that is measured, and the item that it belongs to where it shall follow one. */
export interface Measured {
  readonly atMm: PointMm;
  readonly item?: Item;
}

export function newDimension(
  items: Items,
  id: string,
  from: PointMm | Measured,
  to: PointMm | Measured,
  offsetMm: number,
): Item {
  const [start, end] = [measured(from), measured(to)];
  const [xMm, yMm] = start.atMm;
  return itemSchema.parse({
    ...common(items, 'dimension', { id, xMm, yMm }),
    fromMm: [0, 0],
    toMm: [end.atMm[0] - xMm, end.atMm[1] - yMm],
    offsetMm,
    ...attachment('from', start),
    ...attachment('to', end),
  });
}

const measured = (spot: PointMm | Measured): Measured => ('atMm' in spot ? spot : { atMm: spot });

/** The fields that attach one end of a dimension to an item; they empty that end where there is no item. */
export function attachment(end: 'from' | 'to', { atMm, item }: Measured): Partial<Dimension> {
  const anchorMm = item && floorToItem(item, atMm).map(tidy);
  const anchor: [number, number] | undefined = anchorMm && [anchorMm[0], anchorMm[1]];
  return end === 'from' ? { fromItemId: item?.id, fromAnchorMm: anchor } : { toItemId: item?.id, toAnchorMm: anchor };
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
