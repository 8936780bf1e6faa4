'use client';

import { useCallback, useMemo, useState } from 'react';
import { checkDraft, type CheckedDraft } from '@/lib/editor/arm/check';
import { draftText, type ArmDraft } from '@/lib/editor/arm/draft';
import { useSettled } from '@/lib/client/use-settled';
import type { ArmDefinition } from '@/lib/contracts/arm';
import { useArmStudy, type ArmStudy } from './use-arm-study';
import type { ChangeDraft } from './draft-table';

/** The drawing waits until typing pauses for this long. */
const PAUSE_MS = 150;

export interface DraftInHand {
  readonly draft: ArmDraft;
  readonly change: ChangeDraft;
  readonly checked: CheckedDraft;
  readonly isChanged: boolean;
  readonly study: ArmStudy;
  /** Starts again from another draft, as if it had just been opened. */
  readonly restart: (draft: ArmDraft) => void;
}

/** A draft with what is wrong with it and the study of the last chain that could be drawn. `edited` is taken up as already changed. */
export function useArmDraft(start: () => ArmDraft, edited?: ArmDraft): DraftInHand {
  const [opened, setOpened] = useState(start);
  const [draft, setDraft] = useState(edited ?? opened);
  const change = useCallback<ChangeDraft>((edit) => setDraft(edit), []);
  const restart = useCallback((next: ArmDraft) => {
    setOpened(next);
    setDraft(next);
  }, []);
  const checked = useMemo(() => checkDraft(draft), [draft]);
  const before = useMemo(() => draftText(opened), [opened]);
  const isChanged = useMemo(() => draftText(draft) !== before, [draft, before]);
  return { draft, change, checked, isChanged, restart, study: useSettledStudy(checked.definition) };
}

/** By its text: typing a name makes no new chain. */
function useSettledStudy(definition: ArmDefinition | null): ArmStudy {
  const settled = useSettled(
    useMemo(() => JSON.stringify(definition), [definition]),
    PAUSE_MS,
  );
  return useArmStudy(useMemo(() => JSON.parse(settled) as ArmDefinition | null, [settled]));
}
