'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { toast } from '@/components/ui/toaster';
import { sayError } from '@/lib/client/fetcher';
import { useMemberActions } from '@/lib/client/use-members';
import type { Member } from '@/lib/contracts/accounts';
import { ProjectPicker } from './project-picker';

/** Which projects a viewer may look at. Mount it to open it. */
export function ViewerProjectsDialog({ member, onClose }: { member: Member; onClose: () => void }) {
  const { change } = useMemberActions();
  const [chosen, setChosen] = useState<string[]>(member.projectIds);
  const [busy, setBusy] = useState(false);
  const [fault, setFault] = useState<string>();
  const save = async (): Promise<void> => {
    setBusy(true);
    try {
      await change(member.id, { projectIds: chosen });
      toast.success(`Saved for ${member.name}`);
      onClose();
    } catch (error) {
      setFault(sayError(error));
      setBusy(false);
    }
  };
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Projects of ${member.name}`}
      description="Of these projects a viewer sees the issued revisions, and nothing of the others."
      footer={
        <>
          <Button variant="quiet" onClick={onClose}>
            Cancel
          </Button>
          <Button variant="action" busy={busy} busyLabel="Saving…" onClick={save}>
            Save
          </Button>
        </>
      }
    >
      <ProjectPicker chosen={chosen} onChange={setChosen} error={fault} />
    </Dialog>
  );
}
