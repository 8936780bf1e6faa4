import type { Item } from '@/lib/layout/items';
import type { Change } from '../changes';
import { boxOf } from '../snap-lines';
import { tidy } from '../snapping';
import { state, type Press, type Selection, type Tool, type View } from './tool';

/**
 * Dragging items. The snapshot is the items as they were pressed; every move starts from it again, so the way there leaves no
 * trace. The first item that was pressed snaps to the grid and the others keep their distance from it.
 */
export function movingItems(start: Press, selection: Selection, view: View, rest: () => Tool): Tool {
  const snapshot = unlocked(selection, view);
  const lead = snapshot.find(({ id }) => id === start.target?.itemId) ?? snapshot[0];
  return following('select', 'Release to put it down.', snapshot, lead, start, rest);
}

/**
 * Carrying what is chosen without holding a button: it follows the pointer, and a click puts it down. It is held at the first
 * item's own place, so whoever picks it up by keyboard or from the list need not aim first.
 */
export function carrying(selection: Selection, view: View, rest: () => Tool): Tool {
  const snapshot = unlocked(selection, view);
  return following('carry', 'Click where it goes.', snapshot, snapshot[0], snapshot[0] ?? ANYWHERE, rest);
}

interface FloorSpot {
  readonly xMm: number;
  readonly yMm: number;
}

const ANYWHERE: FloorSpot = { xMm: 0, yMm: 0 };

const unlocked = ({ itemIds }: Selection, { items }: View): Item[] =>
  itemIds.map((id) => items.get(id)).filter((item): item is Item => item !== undefined && !item.locked);

/** The items of the snapshot follow the pointer, which took hold of them at `start`; letting go ends it as one step. */
function following(
  name: 'select' | 'carry',
  prompt: string,
  snapshot: readonly Item[],
  lead: Item | undefined,
  start: FloorSpot,
  rest: () => Tool,
): Tool {
  const moving = new Set(snapshot.map(({ id }) => id));
  const box = boxOf(snapshot);

  const at = (press: Press, view: View): Item[] => {
    if (!lead) return [];
    let [byX, byY] = [press.xMm - start.xMm, press.yMm - start.yMm];
    if (press.shift) [byX, byY] = Math.abs(byX) >= Math.abs(byY) ? [byX, 0] : [0, byY];
    const wanted = { xMm: lead.xMm + byX, yMm: lead.yMm + byY };
    const own = box && { at: lead, box, itemIds: moving };
    const spot = view.snap(wanted, press, own);
    // Held level or upright, the other coordinate stays exactly as it was, on the grid or not.
    const xMm = press.shift && byX === 0 ? lead.xMm : spot.xMm;
    const yMm = press.shift && byY === 0 ? lead.yMm : spot.yMm;
    return snapshot.map((item) => ({
      ...item,
      xMm: tidy(item.xMm + xMm - lead.xMm),
      yMm: tidy(item.yMm + yMm - lead.yMm),
    }));
  };

  const self = state(name, lead ? `${prompt} Alt suspends snapping, Escape takes it back.` : 'It is locked.', {
    busy: true,
    move: (press, now) => ({ tool: self, draft: { items: at(press, now) } }),
    release: (press, now) => ({
      tool: rest(),
      draft: null,
      step: { label: `Move ${named(snapshot)}`, changes: from(snapshot, at(press, now)) },
    }),
    cancel: rest,
  });
  return self;
}

/** What a step was done to, in words. */
export function named(items: readonly { readonly name: string }[]): string {
  return items.length === 1 ? items[0].name : `${items.length} items`;
}

/** The changes from a snapshot to what became of it, item by item. */
export function from(snapshot: readonly Item[], after: readonly Item[]): Change[] {
  return after.map((item, index) => ({ itemId: item.id, before: snapshot[index], after: item }));
}
