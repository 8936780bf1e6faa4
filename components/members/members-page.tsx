'use client';

import { UserPlus } from 'lucide-react';
import { useCallback, useState } from 'react';
import { DataPart } from '@/components/ui/data-part';
import { ROLE_NAMES } from '@/components/shell/role-words';
import { SectionHeader } from '@/components/shell/section-header';
import { MembersTable } from '@/components/tables/members-table';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { Notice } from '@/components/ui/notice';
import { Page } from '@/components/ui/page';
import { Panel } from '@/components/ui/panel';
import { toast } from '@/components/ui/toaster';
import { useAccount, useMayActAs } from '@/lib/client/account-context';
import { sayError } from '@/lib/client/fetcher';
import { useMemberActions, useMembers } from '@/lib/client/use-members';
import type { Member } from '@/lib/contracts/accounts';
import type { Role } from '@/lib/contracts/common';
import { InvitationsPanel } from './invitations-panel';
import { InviteDialog } from './invite-dialog';
import { ViewerProjectsDialog } from './viewer-projects-dialog';

/** Members, their roles, what viewers may look at, and invitations. For admins. */
export function MembersPage() {
  const mayAdmin = useMayActAs('admin');
  if (mayAdmin) return <Members />;
  return (
    <>
      <SectionHeader current="/members" />
      <Page>
        <h1 className="sr-only">Members</h1>
        <Notice tone="caution">Members are kept by the admins of your organisation. Ask one of them.</Notice>
      </Page>
    </>
  );
}

function Members() {
  const account = useAccount();
  const answer = useMembers();
  const { change, remove } = useMemberActions();
  const [isInviting, setIsInviting] = useState(false);
  const [limiting, setLimiting] = useState<Member | null>(null);
  const [leaving, setLeaving] = useState<Member | null>(null);

  const setRole = useCallback(
    async (member: Member, role: Role) => {
      try {
        await change(member.id, { role });
        toast.success(`${member.name} is ${ROLE_NAMES[role].toLowerCase()} now`);
        if (role === 'viewer') setLimiting({ ...member, role, projectIds: [] });
      } catch (error) {
        toast.error(sayError(error));
      }
    },
    [change],
  );

  return (
    <>
      <SectionHeader
        current="/members"
        actions={
          <Button variant="action" onClick={() => setIsInviting(true)}>
            <UserPlus aria-hidden className="size-4" />
            Invite
          </Button>
        }
      />
      <Page className="grid items-start gap-4 lg:grid-cols-[minmax(0,1fr)_26rem]">
        <Panel
          title="Members"
          level={1}
          aside={answer.data && <span className="font-mono">{answer.data.members.length}</span>}
        >
          <DataPart answer={answer} loading="Loading the members">
            {({ members }) => (
              <MembersTable
                members={members}
                ownUserId={account.id}
                onRole={setRole}
                onProjects={setLimiting}
                onRemove={setLeaving}
              />
            )}
          </DataPart>
        </Panel>
        <InvitationsPanel />
      </Page>
      {isInviting && <InviteDialog onClose={() => setIsInviting(false)} />}
      {limiting && <ViewerProjectsDialog member={limiting} onClose={() => setLimiting(null)} />}
      <ConfirmDialog
        open={leaving !== null}
        onOpenChange={(open) => !open && setLeaving(null)}
        title={`Remove ${leaving?.name ?? ''}?`}
        description="They can no longer sign in to this organisation, at once. What they drew and wrote stays."
        confirmLabel="Remove member"
        danger
        onConfirm={async () => {
          if (leaving) await remove(leaving.id);
        }}
      />
    </>
  );
}
