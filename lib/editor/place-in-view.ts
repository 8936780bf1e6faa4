import { settledItems } from '@/lib/layout/attached-dimensions';
import { boundsOfPoints } from '@/lib/layout/viewport';
import type { LibraryFixture } from '@/lib/contracts/library-fixtures';
import type { Item, ItemKind } from '@/lib/layout/items';
import { put, type Change, type Items } from './changes';
import { fixtureAt, footprint } from './footprint';
import {
  newBlock,
  newColumn,
  newDimension,
  newLine,
  newNote,
  newRobot,
  newSectionLine,
  newTaskPoint,
  newZone,
  type Measured,
} from './make-items';
import { copyOfSaved } from './saved-fixtures';
import { snapSpot, type Snapping } from './snapping';
import { chosen, type Selection } from './tools/tool';

/** Placing without a pointer: the thing appears in the middle of the view, and its place is typed afterwards. */
export interface PlaceOrder {
  readonly kind: ItemKind | 'column';
  readonly armId?: string;
  readonly middle: { readonly xMm: number; readonly yMm: number };
  readonly snapping: Snapping;
  readonly newId: () => string;
}

const GUARD_MM = { width: 5000, depth: 4000 };
const LINE_MM = 3000;
/** How far apart things placed one after another stand, so that they do not hide one another. */
const APART_MM = 600;

export interface Placed {
  readonly label: string;
  readonly changes: readonly Change[];
  readonly selection: Selection;
}

export function placeInView(items: Items, order: PlaceOrder): Placed {
  const item = made(items, order);
  return { label: `Place ${item.name}`, changes: [put(items, item)], selection: chosen(item.id) };
}

function made(items: Items, { kind, armId, middle, snapping, newId }: PlaceOrder): Item {
  const id = newId();
  const { xMm, yMm } = snapSpot(freeSpot(items, middle), snapping, false);
  switch (kind) {
    case 'robot':
      if (!armId) throw new Error('A robot is placed with its arm.');
      return newRobot(items, { id, xMm, yMm }, armId);
    case 'fixture':
    case 'obstacle':
      return newBlock(items, kind, { id, xMm, yMm });
    case 'guardLine': {
      const [left, right] = [xMm - GUARD_MM.width / 2, xMm + GUARD_MM.width / 2];
      const [near, far] = [yMm - GUARD_MM.depth / 2, yMm + GUARD_MM.depth / 2];
      const corners: [number, number][] = [
        [left, near],
        [right, near],
        [right, far],
        [left, far],
      ];
      return newLine(items, kind, id, corners, true);
    }
    case 'walkway':
    case 'conveyor':
    case 'protectiveDevice':
      return newLine(items, kind, id, levelLine(xMm, yMm), false);
    case 'dimension':
      return newDimension(items, id, ...levelLine(xMm, yMm), 0);
    case 'sectionLine':
      return newSectionLine(items, id, ...levelLine(xMm, yMm));
    case 'column':
      return newColumn(items, { id, xMm, yMm });
    case 'zone':
      return newZone(items, { id, xMm, yMm });
    case 'note':
      return newNote(items, { id, xMm, yMm });
  }
}

const levelLine = (xMm: number, yMm: number): [[number, number], [number, number]] => [
  [xMm - LINE_MM / 2, yMm],
  [xMm + LINE_MM / 2, yMm],
];

/** A copy of a fixture of the library, in the middle of the view. */
export function placeSavedInView(
  items: Items,
  saved: LibraryFixture,
  { middle, snapping, newId }: Pick<PlaceOrder, 'middle' | 'snapping' | 'newId'>,
): Placed {
  const spot = snapSpot(freeSpot(items, middle), snapping, false);
  const item = copyOfSaved(items, saved, { id: newId(), ...spot }, newId);
  return { label: `Place ${item.name}`, changes: [put(items, item)], selection: chosen(item.id) };
}

/** The middle, or the nearest spot to its right where nothing else is placed. */
function freeSpot(items: Items, middle: PlaceOrder['middle']): PlaceOrder['middle'] {
  const taken = [...items.values()];
  const isFree = (xMm: number) =>
    taken.every((item) => Math.hypot(item.xMm - xMm, item.yMm - middle.yMm) >= APART_MM / 2);
  let { xMm } = middle;
  while (!isFree(xMm)) xMm += APART_MM;
  return { xMm, yMm: middle.yMm };
}

/** A task point on the fixture that is chosen, else on the one nearest to the middle; null where there is no fixture. */
export function placeTaskPointInView(
  items: Items,
  selection: Selection,
  middle: PlaceOrder['middle'],
  newId: () => string,
): Placed | null {
  const picked = selection.itemIds.map((id) => items.get(id)).find((item) => item?.kind === 'fixture');
  const fixture = picked?.kind === 'fixture' ? picked : fixtureAt(items, [middle.xMm, middle.yMm], Infinity);
  if (!fixture) return null;
  const point = newTaskPoint(fixture, newId(), [0, 0]);
  const after = { ...fixture, taskPoints: [...fixture.taskPoints, point] };
  return {
    label: `Place ${point.name}`,
    changes: [put(items, after)],
    selection: { itemIds: [fixture.id], taskPointId: point.id },
  };
}

/** A dimension between the places of two chosen items; it follows them. */
export function measureBetween(items: Items, ids: readonly string[], newId: () => string): Placed | null {
  const [one, other] = ids.map((id) => items.get(id));
  if (!one || !other) return null;
  const item = newDimension(items, newId(), placeOf(one), placeOf(other), APART_MM);
  return { label: `Place ${item.name}`, changes: [put(items, item)], selection: chosen(item.id) };
}

const placeOf = (item: Item): Measured => ({ atMm: [item.xMm, item.yMm], item });

/** The part of the floor that the items take; null on an empty sheet. */
export function boundsOfItems(items: Items) {
  return boundsOfPoints(
    settledItems([...items.values()])
      .filter(({ hidden }) => !hidden)
      .flatMap(footprint),
  );
}
