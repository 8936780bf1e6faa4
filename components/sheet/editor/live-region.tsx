'use client';

import { useEffect } from 'react';
import { toast } from '@/components/ui/toaster';
import { useBoardSheet } from './board-context';

/** Says aloud what happened on the sheet, and shows what was refused. The key makes the same words twice two announcements. */
export function LiveRegion() {
  const said = useBoardSheet((state) => state.said);
  const count = useBoardSheet((state) => state.history.past.length + state.history.future.length);
  const refusal = said?.isRefusal ? said : null;
  // A toast is read aloud by itself.
  useEffect(() => {
    if (refusal) toast.error(refusal.words);
  }, [refusal]);
  return (
    <div aria-live="polite" aria-atomic="true" data-live-region className="sr-only">
      {said && !refusal && <span key={`${said.words} ${count}`}>{said.words}</span>}
    </div>
  );
}
