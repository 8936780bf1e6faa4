'use client';

import { useState } from 'react';
import { DataPart } from '@/components/ui/data-part';
import { ROLE_NAMES } from '@/components/shell/role-words';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { Moment } from '@/components/ui/moment';
import { Panel } from '@/components/ui/panel';
import { Tag } from '@/components/ui/tag';
import { useInvitations, useMemberActions } from '@/lib/client/use-members';
import type { Invitation } from '@/lib/contracts/accounts';

/** The invitations that wait for an answer, and those that ran out. */
export function InvitationsPanel() {
  const answer = useInvitations();
  const { revokeInvitation } = useMemberActions();
  const [ending, setEnding] = useState<Invitation | null>(null);
  return (
    <Panel title="Invitations">
      <DataPart answer={answer} loading="Loading the invitations">
        {({ invitations }) => {
          const open = invitations.filter((invitation) => invitation.acceptedAt === null);
          if (open.length === 0) return <p className="px-3.5 py-3 text-ink-soft">No invitation is open.</p>;
          return (
            <ul>
              {open.map((invitation) => (
                <OpenInvitation key={invitation.id} invitation={invitation} onRevoke={setEnding} />
              ))}
            </ul>
          );
        }}
      </DataPart>
      <ConfirmDialog
        open={ending !== null}
        onOpenChange={(open) => !open && setEnding(null)}
        title="Withdraw this invitation?"
        description={`The link in the mail to ${ending?.email ?? ''} stops working at once.`}
        confirmLabel="Withdraw"
        danger
        onConfirm={async () => {
          if (ending) await revokeInvitation(ending.id);
        }}
      />
    </Panel>
  );
}

interface OpenInvitationProps {
  invitation: Invitation;
  onRevoke: (invitation: Invitation) => void;
}

function OpenInvitation({ invitation, onRevoke }: OpenInvitationProps) {
  const isOver = new Date(invitation.expiresAt) <= new Date();
  return (
    <li className="flex flex-wrap items-center justify-between gap-x-4 gap-y-1 border-t border-hair px-3.5 py-2 first:border-t-0">
      <div className="min-w-0">
        <p className="font-medium break-all">{invitation.email}</p>
        <p className="text-sm text-ink-soft">
          {ROLE_NAMES[invitation.role]}
          {isOver ? null : (
            <>
              {' '}
              · works until <Moment iso={invitation.expiresAt} />
            </>
          )}
        </p>
      </div>
      <div className="flex items-center gap-2">
        {isOver && <Tag tone="tight">Expired</Tag>}
        <Button
          size="small"
          variant="quiet"
          aria-label={`Withdraw the invitation to ${invitation.email}`}
          onClick={() => onRevoke(invitation)}
        >
          Withdraw
        </Button>
      </div>
    </li>
  );
}
