'use client';

import { useMemo } from 'react';
import { layoutSchema } from '@/lib/contracts/layouts';
import { revisionSchema } from '@/lib/contracts/revisions';
import { documentOfLayout, documentOfRevision, type SheetDocument } from './sheet-document';
import type { SheetRef } from './sheet-ref';
import { useAnswer } from './use-answer';

export interface AskedDocument {
  readonly document: SheetDocument | null;
  readonly error: Error | undefined;
  readonly tryAgain: () => void;
}

/** A draft or a revision to be read; null asks nothing. */
export function useSheetDocument(ref: SheetRef | null): AskedDocument {
  const layout = useAnswer(ref?.kind === 'layout' ? `/api/layouts/${ref.id}` : null, layoutSchema);
  const revision = useAnswer(ref?.kind === 'revision' ? `/api/revisions/${ref.id}` : null, revisionSchema, {
    // Its items never change again; its state may.
    revalidateOnFocus: false,
  });
  const document = useMemo(() => {
    if (ref?.kind === 'layout' && layout.data) return documentOfLayout(layout.data);
    return ref?.kind === 'revision' && revision.data ? documentOfRevision(revision.data) : null;
  }, [ref?.kind, layout.data, revision.data]);
  return {
    document,
    error: layout.error ?? revision.error,
    tryAgain: () => void Promise.all([layout.mutate(), revision.mutate()]),
  };
}
