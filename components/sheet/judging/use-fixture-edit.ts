'use client';

import { useBoard } from '@/components/sheet/editor/board-context';
import type { Edit } from '@/lib/editor/edits';
import type { Fixture } from '@/lib/layout/items';

/** Changes a fixture as it is now in one step; answers why it cannot be done, or null. */
export function useFixtureEdit(
  fixture: Fixture,
): (label: string, change: (now: Fixture) => Edit<Fixture>) => string | null {
  const { sheet } = useBoard();
  return (label, change) => {
    // A colleague's edit may have come in since this panel was drawn.
    const now = sheet.getState().items.get(fixture.id);
    const before = now?.kind === 'fixture' ? now : fixture;
    const edit = change(before);
    if (!edit.ok) return edit.message;
    sheet.commit(label, [{ itemId: fixture.id, before, after: edit.value }]);
    return null;
  };
}
