'use client';

import { createContext, useContext, useMemo, useState, type ReactNode } from 'react';
import { RemarksPanel } from '@/components/sheet/panels/remarks-panel';
import { useLayoutRemarks, type LayoutRemarks } from '@/lib/client/use-remarks';
import { useBoard } from './board-context';

/** The remarks on the board, and which of them is open: its pin and its words belong together. */
interface BoardRemarksValue extends LayoutRemarks {
  readonly chosenId: string | null;
  readonly choose: (remarkId: string | null) => void;
}

const RemarksContext = createContext<BoardRemarksValue | null>(null);

export function RemarksProvider({ children }: { readonly children: ReactNode }) {
  const { layout, view } = useBoard();
  const remarks = useLayoutRemarks(layout.id);
  const [chosenId, setChosenId] = useState<string | null>(null);
  const { remarks: list, error, answer, resolve } = remarks;
  const value = useMemo<BoardRemarksValue>(
    () => ({
      remarks: list,
      error,
      answer,
      resolve,
      chosenId,
      choose: (remarkId) => {
        setChosenId(remarkId);
        if (remarkId) view.openSide('remarks');
      },
    }),
    [list, error, answer, resolve, chosenId, view],
  );
  return <RemarksContext value={value}>{children}</RemarksContext>;
}

export function useBoardRemarks(): BoardRemarksValue {
  const value = useContext(RemarksContext);
  if (!value) throw new Error('Remarks belong inside their provider.');
  return value;
}

/** How many remarks nobody has settled. */
export const useOpenRemarks = (): number =>
  useBoardRemarks().remarks?.filter(({ resolvedAt }) => !resolvedAt).length ?? 0;

/** The side panel: what reviewers said about this sheet. */
export function BoardRemarks() {
  const { choose, ...remarks } = useBoardRemarks();
  return <RemarksPanel {...remarks} onChoose={choose} />;
}
