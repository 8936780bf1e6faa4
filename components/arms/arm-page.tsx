'use client';

import { useState } from 'react';
import { SubjectFault } from '@/components/shell/subject-fault';
import { LoadingLine } from '@/components/ui/loading-line';
import { TitleBlock } from '@/components/ui/title-block';
import { useAccount, useMayActAs } from '@/lib/client/account-context';
import { keptDraft } from '@/lib/client/kept-draft';
import { useArm } from '@/lib/client/use-arms';
import { armCells } from './arm-cells';
import { ArmEditor } from './arm-editor';
import { ArmSheet } from './arm-sheet';

/** One version of an arm: integrators edit the newest, everything else is for reading. */
export function ArmPage({ armId }: { armId: string }) {
  const { data: arm, error, mutate } = useArm(armId);
  const mayEdit = useMayActAs('integrator');
  const { id: userId } = useAccount();
  const [editedId, setEditedId] = useState<string | null>(null);
  if (error && !arm) return <SubjectFault what="This arm" error={error} onRetry={() => void mutate()} />;
  if (!arm)
    return (
      <>
        <TitleBlock cells={armCells(undefined)} />
        <LoadingLine label="Loading the arm" />
      </>
    );
  // Somebody may save a newer version while this one is under the pencil: the edits must stay, also over a reload.
  const isEdited = editedId === arm.id || keptDraft(userId, `arm.${arm.id}`).read() !== null;
  if (!mayEdit || arm.archivedAt || (!arm.latest && !isEdited)) return <ArmSheet key={arm.id} arm={arm} />;
  if (editedId !== arm.id) setEditedId(arm.id);
  // One editor an arm: what is typed into one must not end up in another.
  return <ArmEditor key={arm.id} arm={arm} />;
}
