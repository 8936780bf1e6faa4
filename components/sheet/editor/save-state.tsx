'use client';

import { useSaveStatus } from '@/lib/client/use-layout';
import type { LayoutState } from '@/lib/contracts/layouts';
import type { SaveStatus } from '@/lib/editor/autosave';
import { useBoard } from './board-context';

const SAVE_WORDS: Record<SaveStatus['state'], string> = {
  saved: 'saved',
  saving: 'saving',
  offline: 'offline',
  conflict: 'conflict',
  refused: 'not saved',
};

const LAYOUT_WORDS: Record<LayoutState, string> = {
  draft: 'Draft',
  issued: 'Issued',
  accepted: 'Accepted',
  changes_requested: 'Changes asked for',
  superseded: 'Superseded',
};

/** "Draft, saved": what the layout is, and whether it is on the server. */
export function stateWords(layout: LayoutState, save: SaveStatus['state']): string {
  return `${LAYOUT_WORDS[layout]}, ${SAVE_WORDS[save]}`;
}

interface SaveStateProps {
  /** Opens the list of conflicts. */
  readonly onConflict: () => void;
}

/** The state cell of the title block. Its words are announced as they change. */
export function SaveState({ onConflict }: SaveStateProps) {
  const board = useBoard();
  const { state, detail } = useSaveStatus(board);
  const { latestRevision } = board.layout;
  // What is on the board is always the draft; an issued revision is frozen and lives on its own page.
  const words = stateWords('draft', state);
  const title = detail ?? (latestRevision ? `Revision ${latestRevision.number} is issued.` : undefined);
  return (
    <span
      role="status"
      data-save-state={state}
      title={title}
      className={state === 'saved' || state === 'saving' ? 'text-petrol' : 'text-red'}
    >
      {state === 'conflict' ? (
        <button type="button" onClick={onConflict} className="underline underline-offset-2">
          {words}
        </button>
      ) : (
        words
      )}
    </span>
  );
}
