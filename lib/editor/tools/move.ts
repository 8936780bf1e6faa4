import type { Item } from '@/lib/layout/items';
import type { Change } from '../changes';
import { snapSpot, tidy } from '../snapping';
import { state, type Press, type Selection, type Tool, type View } from './tool';

/**
 * Dragging items. The snapshot is the items as they were pressed; every move starts from it again, so the way there leaves no
 * trace. The first item that was pressed snaps to the grid and the others keep their distance from it.
 */
export function movingItems(start: Press, selection: Selection, view: View, rest: () => Tool): Tool {
  const snapshot = selection.itemIds
    .map((id) => view.items.get(id))
    .filter((item): item is Item => item !== undefined && !item.locked);
  const lead = snapshot.find(({ id }) => id === start.target?.itemId) ?? snapshot[0];

  const at = (press: Press, { snapping }: View): Item[] => {
    if (!lead) return [];
    let [byX, byY] = [press.xMm - start.xMm, press.yMm - start.yMm];
    if (press.shift) [byX, byY] = Math.abs(byX) >= Math.abs(byY) ? [byX, 0] : [0, byY];
    const spot = snapSpot({ xMm: lead.xMm + byX, yMm: lead.yMm + byY }, snapping, press.alt);
    // Held level or upright, the other coordinate stays exactly as it was, on the grid or not.
    const xMm = press.shift && byX === 0 ? lead.xMm : spot.xMm;
    const yMm = press.shift && byY === 0 ? lead.yMm : spot.yMm;
    return snapshot.map((item) => ({
      ...item,
      xMm: tidy(item.xMm + xMm - lead.xMm),
      yMm: tidy(item.yMm + yMm - lead.yMm),
    }));
  };

  const hint = lead ? 'Release to put it down. Alt suspends snapping, Escape takes it back.' : 'It is locked.';
  const self = state('select', hint, {
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
