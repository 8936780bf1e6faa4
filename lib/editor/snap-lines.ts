import { itemToFloor, type PointMm } from '@/lib/layout/geometry';
import type { Item } from '@/lib/layout/items';
import { boundsOfPoints, type FloorBounds } from '@/lib/layout/viewport';
import type { Items } from './changes';
import { footprint } from './footprint';
import type { Snapping } from './snapping';
import { snapSpot, tidy } from './snapping';

/** A line that is drawn while something snaps to it: upright at `xMm` or level at `yMm`, as long as what it joins. */
export interface Guide {
  readonly axis: 'x' | 'y';
  readonly atMm: number;
  readonly fromMm: number;
  readonly toMm: number;
  readonly what: 'edge' | 'centre' | 'taskPoint' | 'wall';
}

/** Something to snap to on one axis, with its reach along the other. */
interface SnapLine {
  readonly axis: 'x' | 'y';
  readonly atMm: number;
  readonly fromMm: number;
  readonly toMm: number;
  readonly what: Guide['what'];
  readonly itemId: string | null;
}

/** What is being moved: where its place was, what it covered of the floor then, and which items it is. */
export interface Moved {
  readonly at: { readonly xMm: number; readonly yMm: number };
  readonly box: FloorBounds;
  readonly itemIds: ReadonlySet<string>;
}

export function boxOf(items: readonly Item[]): FloorBounds | null {
  return boundsOfPoints(items.flatMap(footprint));
}

/** The lines that the items of a sheet offer: both edges and the middle of what they cover, their places, and their task points. */
function linesOfItem(item: Item): SnapLine[] {
  // What measures or explains is no edge of anything.
  const isWords = item.kind === 'dimension' || item.kind === 'note';
  const box = item.hidden || isWords ? null : boxOf([item]);
  if (!box) return [];
  const both = (xMm: number, yMm: number, what: Guide['what']): SnapLine[] => [
    { axis: 'x', atMm: xMm, fromMm: box.minYMm, toMm: box.maxYMm, what, itemId: item.id },
    { axis: 'y', atMm: yMm, fromMm: box.minXMm, toMm: box.maxXMm, what, itemId: item.id },
  ];
  const points = item.kind === 'fixture' ? item.taskPoints : [];
  return [
    ...both((box.minXMm + box.maxXMm) / 2, (box.minYMm + box.maxYMm) / 2, 'centre'),
    ...both(item.xMm, item.yMm, 'centre'),
    ...both(box.minXMm, box.minYMm, 'edge'),
    ...both(box.maxXMm, box.maxYMm, 'edge'),
    ...points.flatMap((point) => pointLines(itemToFloor(item, [point.xMm, point.yMm]), 'taskPoint', item.id)),
  ];
}

function pointLines([xMm, yMm]: PointMm, what: Guide['what'], itemId: string | null): SnapLine[] {
  return [
    { axis: 'x', atMm: xMm, fromMm: yMm, toMm: yMm, what, itemId },
    { axis: 'y', atMm: yMm, fromMm: xMm, toMm: xMm, what, itemId },
  ];
}

// An item that did not change offers the same lines: a drag over 500 items works them out once.
const known = new WeakMap<Item, SnapLine[]>();

function linesOf(item: Item): SnapLine[] {
  const before = known.get(item);
  if (before) return before;
  const lines = linesOfItem(item);
  known.set(item, lines);
  return lines;
}

interface SnapRequest {
  /** Where the thing would be without snapping, floor frame. */
  readonly wanted: { readonly xMm: number; readonly yMm: number };
  readonly items: Items;
  /** Corners of walls and other marks of the floor plan, floor frame. */
  readonly planPoints: readonly PointMm[];
  readonly snapping: Snapping;
  readonly reachMm: number;
  readonly moved?: Moved | null;
}

export interface Snapped {
  readonly xMm: number;
  readonly yMm: number;
  readonly guides: readonly Guide[];
}

/**
 * Snaps a place to what is near: edges, centres and task points of other items, points of the floor plan, else the grid. Each axis
 * by itself. A box that moves snaps with its edges, its middle and its place; a spot with itself.
 */
export function snapNear({ wanted, items, planPoints, snapping, reachMm, moved }: SnapRequest): Snapped {
  const grid = snapSpot(wanted, snapping, false);
  const offsets = ownOffsets(moved);
  const best: Record<'x' | 'y', { line: SnapLine; by: number; offset: number } | null> = { x: null, y: null };
  const consider = (line: SnapLine) => {
    const here = line.axis === 'x' ? wanted.xMm : wanted.yMm;
    for (const offset of offsets[line.axis]) {
      const by = line.atMm - (here + offset);
      const found = best[line.axis];
      if (Math.abs(by) <= reachMm && (!found || Math.abs(by) < Math.abs(found.by) - 1e-9)) {
        best[line.axis] = { line, by, offset };
      }
    }
  };
  if (snapping.toItems) {
    for (const item of items.values()) if (!moved?.itemIds.has(item.id)) linesOf(item).forEach(consider);
  }
  if (snapping.toPlan) snapToPlan(wanted, planPoints, offsets, reachMm, consider);
  const xMm = best.x ? tidy(wanted.xMm + best.x.by) : grid.xMm;
  const yMm = best.y ? tidy(wanted.yMm + best.y.by) : grid.yMm;
  const spot = { xMm, yMm };
  const guides = [best.x, best.y].flatMap((found) => (found ? [guideOf(found.line, spot, moved)] : []));
  return { ...spot, guides };
}

/** Marks of the plan count as points and not as lines across the hall: there are hundreds, and one would always be near. */
function snapToPlan(
  wanted: { readonly xMm: number; readonly yMm: number },
  planPoints: readonly PointMm[],
  offsets: ReturnType<typeof ownOffsets>,
  reachMm: number,
  consider: (line: SnapLine) => void,
): void {
  for (const point of planPoints) {
    const isNear =
      offsets.x.some((offset) => Math.abs(point[0] - wanted.xMm - offset) <= reachMm) &&
      offsets.y.some((offset) => Math.abs(point[1] - wanted.yMm - offset) <= reachMm);
    if (isNear) pointLines(point, 'wall', null).forEach(consider);
  }
}

function ownOffsets(moved: Moved | null | undefined): Record<'x' | 'y', number[]> {
  if (!moved) return { x: [0], y: [0] };
  const { at, box } = moved;
  return {
    x: [0, box.minXMm - at.xMm, (box.minXMm + box.maxXMm) / 2 - at.xMm, box.maxXMm - at.xMm],
    y: [0, box.minYMm - at.yMm, (box.minYMm + box.maxYMm) / 2 - at.yMm, box.maxYMm - at.yMm],
  };
}

/** From what is snapped to, to what snaps. */
function guideOf(line: SnapLine, spot: { xMm: number; yMm: number }, moved: Moved | null | undefined): Guide {
  const along = line.axis === 'x' ? spot.yMm : spot.xMm;
  const shift = moved ? along - (line.axis === 'x' ? moved.at.yMm : moved.at.xMm) : 0;
  const [from, to] = !moved
    ? [along, along]
    : line.axis === 'x'
      ? [moved.box.minYMm + shift, moved.box.maxYMm + shift]
      : [moved.box.minXMm + shift, moved.box.maxXMm + shift];
  const { axis, atMm, what } = line;
  return { axis, atMm, what, fromMm: Math.min(line.fromMm, from), toMm: Math.max(line.toMm, to) };
}
