import { z } from 'zod';
import { guestSignOffRequestSchema } from '@/lib/contracts/sign-offs';
import { answer, route } from '@/lib/server/http';
import { takeGuestWrite } from '@/lib/server/rate-limit';
import { openToken } from '@/lib/server/share/data';
import { guestMarkHeader } from '@/lib/server/share/guest-mark';
import { sealed, tokenParam } from '@/lib/server/share/sealed';
import { readSignOffs } from '@/lib/server/sign-offs/read-sign-offs';
import { signRevision } from '@/lib/server/sign-offs/sign-revision';

const params = z.object({ token: tokenParam });

export const GET = sealed(
  route({ role: 'public', params }, async ({ params }) => {
    const { actor } = await openToken(params.token);
    return readSignOffs(actor, actor.revisionId);
  }),
);

export const POST = sealed(
  route(
    { role: 'public', params, body: guestSignOffRequestSchema },
    async ({ params, body: { guest, ...signOff } }) => {
      const { actor } = await openToken(params.token);
      await takeGuestWrite(actor.shareLinkId);
      const state = await signRevision({ actor, guest }, actor.revisionId, signOff);
      return answer(state, { status: 201, headers: guestMarkHeader(guest.email) });
    },
  ),
);
