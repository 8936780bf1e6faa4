import type { Item } from '@/lib/layout/items';

import { snapAngle } from '../snapping';
import { from, named } from './move';
import { state, type Press, type Tool, type View } from './tool';

/** Turning the chosen items by their handle, each about its own place; the handle's item snaps to the angle steps. */
export function turning(start: Press, view: View, rest: () => Tool): Tool {
  const snapshot = view.selection.itemIds
    .map((id) => view.items.get(id))
    .filter((item): item is Item => item !== undefined && !item.locked);
  const lead = snapshot.find(({ id }) => id === start.target?.itemId) ?? snapshot[0];

  const heading = (press: Press) => (Math.atan2(press.yMm - lead.yMm, press.xMm - lead.xMm) * 180) / Math.PI;
  const at = (press: Press, { snapping }: View): Item[] => {
    if (!lead) return [];
    const byDeg = snapAngle(lead.angleDeg + heading(press) - heading(start), snapping, press.alt) - lead.angleDeg;
    return snapshot.map((item) => ({ ...item, angleDeg: snapAngle(item.angleDeg + byDeg, snapping, true) }));
  };

  const self = state('select', lead ? 'Release to keep the turn. Alt suspends the steps.' : 'It is locked.', {
    busy: true,
    move: (press, now) => ({ tool: self, draft: { items: at(press, now) } }),
    release: (press, now) => ({
      tool: rest(),
      draft: null,
      step: { label: `Turn ${named(snapshot)}`, changes: from(snapshot, at(press, now)) },
    }),
    cancel: rest,
  });
  return self;
}
