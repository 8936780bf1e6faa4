'use client';

import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { useSaveStatus } from '@/lib/client/use-layout';
import { useBoard } from './board-context';

/** What stands in the way of saving, over the sheet and never in the way of it. */
export function TroubleLine({ onConflict }: { readonly onConflict: () => void }) {
  const board = useBoard();
  const { state, detail } = useSaveStatus(board);
  if (!detail) return null;
  const isConflict = state === 'conflict';
  return (
    <Notice
      tone={state === 'offline' ? 'caution' : 'trouble'}
      action={
        <Button size="small" onClick={isConflict ? onConflict : () => board.autosave.wake()}>
          {isConflict ? 'Choose' : 'Try now'}
        </Button>
      }
      className="pointer-events-auto"
    >
      {detail}
    </Notice>
  );
}
