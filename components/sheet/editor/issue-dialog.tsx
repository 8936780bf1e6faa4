'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { TextArea } from '@/components/ui/text-input';
import { sayError, send } from '@/lib/client/fetcher';
import { useSaveStatus } from '@/lib/client/use-layout';
import { revisionSummarySchema } from '@/lib/contracts/revisions';
import { useBoard } from './board-context';
import { useFloor } from './floor-context';

interface IssueDialogProps {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
}

/** Freezes the sheet as a numbered revision and goes to it. */
export function IssueDialog({ open, onOpenChange }: IssueDialogProps) {
  const board = useBoard();
  const { state } = useSaveStatus(board);
  const router = useRouter();
  const [note, setNote] = useState('');
  const [busy, setBusy] = useState(false);
  const [fault, setFault] = useState<string | null>(null);
  const number = (board.layout.latestRevision?.number ?? 0) + 1;

  const issue = async () => {
    setBusy(true);
    setFault(null);
    try {
      const url = `/api/layouts/${encodeURIComponent(board.layout.id)}/revisions`;
      const revision = await send('POST', url, { note }, revisionSummarySchema);
      router.push(`/revisions/${revision.id}`);
    } catch (error) {
      setFault(sayError(error));
      setBusy(false);
    }
  };

  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title="Issue for review"
      description={`Revision ${number} is a frozen copy of this sheet: it never changes again. You can go on editing the draft, and share the revision by a link.`}
      footer={
        <>
          <Button variant="quiet" onClick={() => onOpenChange(false)}>
            Cancel
          </Button>
          <Button variant="action" busy={busy} busyLabel="Issuing" disabled={state !== 'saved'} onClick={issue}>
            Issue revision {number}
          </Button>
        </>
      }
    >
      <div className="grid gap-3">
        <Field label="Note to the reviewer" hint="What is new, or what you want them to look at. It may stay empty.">
          <TextArea rows={3} maxLength={2000} value={note} onChange={(event) => setNote(event.target.value)} />
        </Field>
        {state !== 'saved' && <Notice tone="caution">The sheet is not saved yet. Wait until it says “saved”.</Notice>}
        <UnfinishedMaps />
        {fault && <Notice tone="trouble">{fault}</Notice>}
      </div>
    </Dialog>
  );
}

function UnfinishedMaps() {
  const { unfinished } = useFloor();
  if (unfinished === 0) return null;
  return (
    <Notice tone="caution">
      {unfinished === 1 ? 'One map is' : `${unfinished} maps are`} not finished. What is issued now shows the sheet
      without {unfinished === 1 ? 'it' : 'them'}.
    </Notice>
  );
}
