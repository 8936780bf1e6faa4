'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { Menu, MenuItem } from '@/components/ui/menu';
import { Button } from '@/components/ui/button';
import { send } from '@/lib/client/fetcher';
import { layoutSummarySchema } from '@/lib/contracts/layouts';
import type { Revision } from '@/lib/contracts/revisions';

/** What a planner can do from a revision: go to the draft, see what has changed since, restore it. */
export function RevisionActions({ revision }: { readonly revision: Revision }) {
  const { id, projectId, layoutId, number } = revision;
  const router = useRouter();
  const [isRestoring, setRestoring] = useState(false);
  return (
    <>
      <Menu trigger={<Button>Open</Button>}>
        <MenuItem onSelect={() => router.push(`/projects/${projectId}/layouts/${layoutId}`)}>The sheet</MenuItem>
        <MenuItem
          onSelect={() => router.push(`/projects/${projectId}/compare?left=revision:${id}&right=layout:${layoutId}`)}
        >
          What changed since
        </MenuItem>
        <MenuItem onSelect={() => router.push(`/revisions/${id}/hand-over`)}>Hand over</MenuItem>
        <MenuItem onSelect={() => setRestoring(true)}>Restore as a new draft…</MenuItem>
      </Menu>
      <ConfirmDialog
        open={isRestoring}
        onOpenChange={setRestoring}
        title={`Restore revision ${number}?`}
        description="A new variant under the next letter starts with what this revision froze. The sheet that it was issued from stays as it is."
        confirmLabel="Restore as a new draft"
        onConfirm={async () => {
          const layout = await send('POST', `/api/revisions/${id}/restore`, undefined, layoutSummarySchema);
          router.push(`/projects/${projectId}/layouts/${layout.id}`);
        }}
      />
    </>
  );
}
