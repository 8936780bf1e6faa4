import { floorToItem, itemToFloor } from './geometry';
import type { Dimension, Item } from './items';

/** Dimensions that hold on to what they measure. */

type ItemOf = (id: string) => Item | undefined;
type End = 'from' | 'to';

/** No measured point is finer than a hundredth of a millimetre. */
const tidy = (value: number): number => Math.round(value * 100) / 100 + 0;

/** Where an end stands, in the dimension's own frame. Without its item it stays where it last stood. */
function endMm(dimension: Dimension, end: End, itemOf: ItemOf): [number, number] {
  const [itemId, anchorMm, lastMm] =
    end === 'from'
      ? [dimension.fromItemId, dimension.fromAnchorMm, dimension.fromMm]
      : [dimension.toItemId, dimension.toAnchorMm, dimension.toMm];
  const item = itemId ? itemOf(itemId) : undefined;
  if (!item) return lastMm;
  const [x, y] = floorToItem(dimension, itemToFloor(item, anchorMm ?? [0, 0]));
  return [tidy(x), tidy(y)];
}

export const isAttached = (item: Item): item is Dimension =>
  item.kind === 'dimension' && (item.fromItemId !== undefined || item.toItemId !== undefined);

/** The dimension with its ends where the items that it measures stand now. */
export function settledDimension(dimension: Dimension, itemOf: ItemOf): Dimension {
  const fromMm = endMm(dimension, 'from', itemOf);
  const toMm = endMm(dimension, 'to', itemOf);
  const same = (one: readonly number[], other: readonly number[]) => one[0] === other[0] && one[1] === other[1];
  return same(fromMm, dimension.fromMm) && same(toMm, dimension.toMm) ? dimension : { ...dimension, fromMm, toMm };
}

interface Settled {
  readonly from: Item | undefined;
  readonly to: Item | undefined;
  readonly dimension: Dimension;
}
// Drawing compares items by identity, so a dimension whose items rest must come out as the same object again.
const known = new WeakMap<Dimension, Settled>();

/** A sheet's items, each attached dimension where its items carry it. What did not change keeps its identity. */
export function settledItems(items: readonly Item[]): readonly Item[] {
  if (!items.some(isAttached)) return items;
  const byId = new Map(items.map((item) => [item.id, item]));
  return items.map((item) => {
    if (!isAttached(item)) return item;
    const [from, to] = [byId.get(item.fromItemId ?? ''), byId.get(item.toItemId ?? '')];
    const before = known.get(item);
    if (before && before.from === from && before.to === to) return before.dimension;
    const dimension = settledDimension(item, (id) => byId.get(id));
    known.set(item, { from, to, dimension });
    return dimension;
  });
}

/** The dimension left where it stands now, without the ends that `isGone` names; null where it holds on to none of them. */
export function detached(dimension: Dimension, isGone: (itemId: string) => boolean, itemOf: ItemOf): Dimension | null {
  const gone = (itemId: string | undefined) => itemId !== undefined && isGone(itemId);
  if (!gone(dimension.fromItemId) && !gone(dimension.toItemId)) return null;
  const { fromItemId, fromAnchorMm, toItemId, toAnchorMm, ...rest } = settledDimension(dimension, itemOf);
  return {
    ...rest,
    ...(fromItemId && !gone(fromItemId) && { fromItemId, fromAnchorMm }),
    ...(toItemId && !gone(toItemId) && { toItemId, toAnchorMm }),
  };
}
