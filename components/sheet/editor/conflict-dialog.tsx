'use client';

import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import type { Conflict } from '@/lib/editor/sync';
import { itemDifferences } from '@/lib/editor/item-differences';
import { kindWords } from '@/lib/editor/make-items';
import type { Item } from '@/lib/layout/items';
import { useBoard, useBoardSheet } from './board-context';

interface ConflictDialogProps {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
}

/** Items that somebody else changed too: both versions side by side, and a choice for each. Nothing is decided unasked. */
export function ConflictDialog({ open, onOpenChange }: ConflictDialogProps) {
  const { sheet } = useBoard();
  const conflicts = useBoardSheet((state) => state.sync.conflicts);
  const items = useBoardSheet((state) => state.items);
  const decide = (itemId: string, choice: 'mine' | 'theirs') => {
    sheet.decide(itemId, choice);
    if (sheet.getState().sync.conflicts.length === 0) onOpenChange(false);
  };
  return (
    <Dialog
      wide
      open={open && conflicts.length > 0}
      onOpenChange={onOpenChange}
      title="Changed by two people"
      description="While you worked, a colleague changed the same items. Choose which version stays; the other one is gone then."
    >
      <ul className="grid gap-4">
        {conflicts.map((conflict) => (
          <OneConflict
            key={conflict.itemId}
            conflict={conflict}
            mine={items.get(conflict.itemId) ?? null}
            onDecide={(choice) => decide(conflict.itemId, choice)}
          />
        ))}
      </ul>
    </Dialog>
  );
}

interface OneConflictProps {
  readonly conflict: Conflict;
  readonly mine: Item | null;
  readonly onDecide: (choice: 'mine' | 'theirs') => void;
}

function OneConflict({ conflict, mine, onDecide }: OneConflictProps) {
  const theirs = conflict.theirs?.item ?? null;
  const named = mine ?? theirs;
  if (!named) return null;
  const rows = mine && theirs ? itemDifferences(mine, theirs) : [];
  return (
    <li className="border border-rule">
      <h3 className="border-b border-hair px-3 py-1.5 font-semibold">
        {kindWords(named)} {named.name}
      </h3>
      <table className="w-full text-left text-sm">
        <thead>
          <tr className="text-ink-soft">
            <th scope="col" className="w-1/3 px-3 py-1 font-medium">
              <span className="sr-only">Value</span>
            </th>
            <th scope="col" className="px-3 py-1 font-medium">
              Yours
            </th>
            <th scope="col" className="px-3 py-1 font-medium">
              Theirs
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map(({ what, left, right }) => (
            <tr key={what} className="border-t border-hair">
              <th scope="row" className="px-3 py-1 font-normal text-ink-soft">
                {what}
              </th>
              <td className="px-3 py-1 font-mono">{left}</td>
              <td className="px-3 py-1 font-mono">{right}</td>
            </tr>
          ))}
          {rows.length === 0 && (
            <tr className="border-t border-hair">
              <th scope="row" className="px-3 py-1 font-normal text-ink-soft">
                The item
              </th>
              <td className="px-3 py-1">{mine ? 'changed' : 'deleted'}</td>
              <td className="px-3 py-1">{theirs ? 'changed' : 'deleted'}</td>
            </tr>
          )}
        </tbody>
      </table>
      <div className="flex justify-end gap-2 border-t border-hair px-3 py-2">
        <Button size="small" onClick={() => onDecide('mine')}>
          Keep yours
        </Button>
        <Button size="small" onClick={() => onDecide('theirs')}>
          Take theirs
        </Button>
      </div>
    </li>
  );
}
