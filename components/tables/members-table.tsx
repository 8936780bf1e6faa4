'use client';

import { UserMinus } from 'lucide-react';
import { useMemo } from 'react';
import { ROLE_NAMES, ROLES_IN_ORDER } from '@/components/shell/role-words';
import { Button } from '@/components/ui/button';
import { Moment } from '@/components/ui/moment';
import { Select } from '@/components/ui/select';
import type { Member } from '@/lib/contracts/accounts';
import type { Role } from '@/lib/contracts/common';
import { SortableTable, type TableColumn } from './sortable-table';

interface MembersTableProps {
  members: readonly Member[];
  /** The reader's own row cannot be changed: nobody locks themselves out by a slip. */
  ownUserId: string;
  onRole: (member: Member, role: Role) => void;
  onProjects: (member: Member) => void;
  onRemove: (member: Member) => void;
}

const ROLE_OPTIONS = ROLES_IN_ORDER.map((value) => ({ value, label: ROLE_NAMES[value] }));

const saysProjects = (count: number): string =>
  count === 0 ? 'No project yet' : count === 1 ? '1 project' : `${count} projects`;

function ProjectsButton({ member, onProjects }: { member: Member } & Pick<MembersTableProps, 'onProjects'>) {
  return (
    <Button size="small" aria-label={`Projects of ${member.name}`} onClick={() => onProjects(member)}>
      {saysProjects(member.projectIds.length)}
    </Button>
  );
}

/** Everyone in the organisation, by name. */
export function MembersTable({ members, ownUserId, onRole, onProjects, onRemove }: MembersTableProps) {
  const columns = useMemo<TableColumn<Member>[]>(
    () => [
      {
        id: 'name',
        header: 'Name',
        value: (member) => member.name,
        cell: (member) => (
          <>
            <span className="font-medium">{member.name}</span>
            {member.userId === ownUserId && <span className="text-ink-soft"> (you)</span>}
            <span className="block text-sm break-all text-ink-soft md:hidden">{member.email}</span>
          </>
        ),
      },
      {
        id: 'email',
        header: 'E-mail',
        value: (member) => member.email,
        cell: (member) => member.email,
        className: 'max-md:hidden',
      },
      {
        id: 'role',
        header: 'Role',
        value: (member) => ROLES_IN_ORDER.indexOf(member.role),
        cell: (member) => (
          <span className="flex flex-col items-start gap-1">
            {member.userId === ownUserId ? (
              <span className="px-2.5">{ROLE_NAMES[member.role]}</span>
            ) : (
              <Select
                aria-label={`Role of ${member.name}`}
                value={member.role}
                onValueChange={(role) => onRole(member, role)}
                options={ROLE_OPTIONS}
                className="min-h-8! w-32!"
              />
            )}
            {member.role === 'viewer' && (
              <span className="sm:hidden">
                <ProjectsButton member={member} onProjects={onProjects} />
              </span>
            )}
          </span>
        ),
      },
      {
        id: 'projects',
        header: 'May look at',
        value: (member) => (member.role === 'viewer' ? member.projectIds.length : Number.MAX_SAFE_INTEGER),
        cell: (member) =>
          member.role === 'viewer' ? (
            <ProjectsButton member={member} onProjects={onProjects} />
          ) : (
            <span className="px-2.5 text-ink-soft">All projects</span>
          ),
        wideOnly: true,
      },
      {
        id: 'joined',
        header: 'Joined',
        value: (member) => member.joinedAt,
        cell: (member) => <Moment iso={member.joinedAt} className="text-ink-soft" />,
        wideOnly: true,
      },
      {
        id: 'remove',
        header: 'Remove',
        headerHidden: true,
        cell: (member) =>
          member.userId !== ownUserId && (
            <Button variant="quiet" size="icon" aria-label={`Remove ${member.name}`} onClick={() => onRemove(member)}>
              <UserMinus aria-hidden className="size-4" />
            </Button>
          ),
        className: 'w-10',
      },
    ],
    [ownUserId, onRole, onProjects, onRemove],
  );
  return (
    <SortableTable
      caption="Members"
      rows={members}
      columns={columns}
      rowId={(member) => member.id}
      sortedBy={{ id: 'name' }}
    />
  );
}
