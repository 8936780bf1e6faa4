'use client';

import { useState } from 'react';
import { ShareLinkDialog } from '@/components/forms/share-link-dialog';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { LoadingLine } from '@/components/ui/loading-line';
import { Notice } from '@/components/ui/notice';
import { Select } from '@/components/ui/select';
import { useRevisions } from '@/lib/client/use-revisions';
import type { RevisionSummary } from '@/lib/contracts/revisions';

interface ShareDialogProps {
  readonly layoutId: string;
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
}

/** From a sheet to the share links of one of its revisions. Only what was issued is shared, never a draft. */
export function ShareDialog({ layoutId, open, onOpenChange }: ShareDialogProps) {
  return open ? <OpenShareDialog layoutId={layoutId} onClose={() => onOpenChange(false)} /> : null;
}

function OpenShareDialog({ layoutId, onClose }: { readonly layoutId: string; readonly onClose: () => void }) {
  const { data, error, mutate } = useRevisions(layoutId);
  const [chosen, setChosen] = useState<RevisionSummary | null>(null);
  const revisions = data?.revisions ?? [];
  const only = revisions.length === 1 ? revisions[0] : null;
  const revision = chosen ?? only;
  if (revision) {
    return <ShareLinkDialog revisionId={revision.id} revisionName={`revision ${revision.number}`} onClose={onClose} />;
  }
  return (
    <Dialog open onOpenChange={(next) => !next && onClose()} title="Share the sheet">
      {error ? (
        <Notice tone="trouble" action={<Button onClick={() => void mutate()}>Try again</Button>}>
          {error.message}
        </Notice>
      ) : !data ? (
        <LoadingLine label="Loading the revisions" />
      ) : revisions.length === 0 ? (
        <p className="max-w-prose">
          Nothing of this sheet has been issued yet. Issue it for review first: what you share is that frozen revision,
          and you can go on drawing.
        </p>
      ) : (
        <label className="grid gap-1 text-sm text-ink-soft">
          Which revision
          <Select
            aria-label="Which revision"
            value={undefined}
            placeholder="Choose a revision"
            onValueChange={(id) => setChosen(revisions.find((entry) => entry.id === id) ?? null)}
            options={revisions.map(({ id, number, note }) => ({
              value: id,
              label: `Revision ${number}`,
              note: note || undefined,
            }))}
          />
        </label>
      )}
    </Dialog>
  );
}
