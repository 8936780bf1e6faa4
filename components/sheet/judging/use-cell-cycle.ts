'use client';

import { useDeferredValue, useMemo, useState } from 'react';
import { useBoard, useBoardSheet } from '@/components/sheet/editor/board-context';
import { inOrder } from '@/lib/editor/order';
import { shownItems } from '@/lib/editor/sheet';
import { makeCycleJudge, type CellCycles } from '@/lib/layout/cycle/cycle-judge';

/** The cycles of the sheet's robots as it is shown now; they may lag a moment behind what is dragged. */
export function useCellCycle(): CellCycles {
  const { arms } = useBoard();
  const items = useBoardSheet((state) => state.items);
  const draft = useBoardSheet((state) => state.draft);
  const shown = useMemo(() => inOrder(shownItems({ items, draft })).filter(({ hidden }) => !hidden), [items, draft]);
  const judged = useDeferredValue(shown);
  const [judge] = useState(makeCycleJudge);
  return useMemo(() => judge(judged, (armId) => arms.get(armId)?.definition), [judge, judged, arms]);
}
