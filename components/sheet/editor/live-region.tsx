'use client';

import { useBoardSheet } from './board-context';

/** Says aloud what happened on the sheet. The key makes the same words twice two announcements. */
export function LiveRegion() {
  const said = useBoardSheet((state) => state.said);
  const count = useBoardSheet((state) => state.history.past.length + state.history.future.length);
  return (
    <div aria-live="polite" aria-atomic="true" data-live-region className="sr-only">
      {said && <span key={`${said.words} ${count}`}>{said.words}</span>}
    </div>
  );
}
