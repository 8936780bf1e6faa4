'use client';

import { useBoard } from '@/components/sheet/editor/board-context';
import { edited } from '@/lib/editor/edits';
import type { Item } from '@/lib/layout/items';

/** Sets fields of an item as one step; answers why they cannot be set, or null. */
export function useItemEdit<T extends Item>(item: T): (what: string, patch: Partial<T>) => string | null {
  const { sheet } = useBoard();
  return (what, patch) => {
    // The item as it is now: a colleague's edit may have come in since this panel was drawn.
    const now = sheet.getState().items.get(item.id);
    const edit = edited((now ?? item) as T, patch);
    if (!edit.ok) return edit.message;
    sheet.commit(`${what} of ${item.name}`, [{ itemId: item.id, before: now ?? null, after: edit.value }]);
    return null;
  };
}
