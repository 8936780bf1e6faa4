'use client';

import { useMemo } from 'react';
import { useSWRConfig } from 'swr';
import type { z } from 'zod';
import {
  invitationsSchema,
  membersSchema,
  type invitationRequestSchema,
  type memberChangeSchema,
} from '@/lib/contracts/accounts';
import { send } from './fetcher';
import { useAnswer } from './use-answer';

const MEMBERS = '/api/members';
const INVITATIONS = '/api/invitations';

export function useMembers() {
  return useAnswer(MEMBERS, membersSchema);
}

export function useInvitations() {
  return useAnswer(INVITATIONS, invitationsSchema);
}

/** Roles, project limits, invitations. Throws ProblemError. */
export function useMemberActions() {
  const { mutate } = useSWRConfig();
  return useMemo(
    () => ({
      async change(memberId: string, change: z.input<typeof memberChangeSchema>): Promise<void> {
        await send('PATCH', `${MEMBERS}/${memberId}`, change);
        await mutate(MEMBERS);
      },
      async remove(memberId: string): Promise<void> {
        await send('DELETE', `${MEMBERS}/${memberId}`);
        await mutate(MEMBERS);
      },
      async invite(request: z.input<typeof invitationRequestSchema>): Promise<void> {
        await send('POST', INVITATIONS, request);
        await mutate(INVITATIONS);
      },
      async revokeInvitation(invitationId: string): Promise<void> {
        await send('DELETE', `${INVITATIONS}/${invitationId}`);
        await mutate(INVITATIONS);
      },
    }),
    [mutate],
  );
}
