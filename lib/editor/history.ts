import { invert, isIdle, rebase, type Change, type Items } from './changes';

/** One gesture: what it was, in words for the tooltip and the announcement, and what it did. */
export interface Step {
  readonly label: string;
  readonly changes: readonly Change[];
}

export interface History {
  readonly past: readonly Step[];
  readonly future: readonly Step[];
}

/** Steps kept. A step is small; the bound only keeps a sheet that stays open for weeks from growing for ever. */
const DEPTH = 2000;

export const EMPTY_HISTORY: History = { past: [], future: [] };

/** Adds a step and drops what could have been redone. A step that changes nothing leaves no trace. */
export function record(history: History, label: string, changes: readonly Change[]): History {
  const real = changes.filter((change) => !isIdle(change));
  if (real.length === 0) return history;
  return { past: [...history.past, { label, changes: real }].slice(-DEPTH), future: [] };
}

/** What a walk through the history asks for: the changes to make now, and the history after them. */
export interface Walk {
  readonly label: string;
  readonly changes: readonly Change[];
  readonly history: History;
}

/** The newest step taken back on the sheet as it stands now; null with nothing to undo. */
export function undo(history: History, items: Items): Walk | null {
  const step = history.past.at(-1);
  if (!step) return null;
  return {
    label: step.label,
    changes: rebase(items, invert(step.changes)),
    history: { past: history.past.slice(0, -1), future: [...history.future, step] },
  };
}

/** The step undone last, made again on the sheet as it stands now; null with nothing to redo. */
export function redo(history: History, items: Items): Walk | null {
  const step = history.future.at(-1);
  if (!step) return null;
  return {
    label: step.label,
    changes: rebase(items, step.changes),
    history: { past: [...history.past, step], future: history.future.slice(0, -1) },
  };
}
