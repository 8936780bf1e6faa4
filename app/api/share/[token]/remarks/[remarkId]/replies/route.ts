import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { guestReplyRequestSchema } from '@/lib/contracts/remarks';
import { answer, route } from '@/lib/server/http';
import { takeGuestWrite } from '@/lib/server/rate-limit';
import { postReply } from '@/lib/server/remarks/post-reply';
import { openToken } from '@/lib/server/share/data';
import { guestMarkHeader } from '@/lib/server/share/guest-mark';
import { sealed, tokenParam } from '@/lib/server/share/sealed';

const params = z.object({ token: tokenParam, remarkId: idSchema });

export const POST = sealed(
  route({ role: 'public', params, body: guestReplyRequestSchema }, async ({ params, body: { guest, ...reply } }) => {
    const { actor } = await openToken(params.token);
    await takeGuestWrite(actor.shareLinkId);
    const answered = await postReply({ actor, guest }, params.remarkId, reply);
    return answer(answered, { status: 201, headers: guestMarkHeader(guest.email) });
  }),
);
