import { z } from 'zod';
import { guestRemarkRequestSchema } from '@/lib/contracts/remarks';
import { answer, route } from '@/lib/server/http';
import { takeGuestWrite } from '@/lib/server/rate-limit';
import { postRemark } from '@/lib/server/remarks/post-remark';
import { readRevisionRemarks } from '@/lib/server/remarks/read-remarks';
import { openToken } from '@/lib/server/share/data';
import { guestMarkHeader, readGuestMark } from '@/lib/server/share/guest-mark';
import { sealed, tokenParam } from '@/lib/server/share/sealed';

const params = z.object({ token: tokenParam });

export const GET = sealed(
  route({ role: 'public', params }, async ({ params, request }) => {
    const { actor } = await openToken(params.token);
    const reader = { actor, guestMark: readGuestMark(request) };
    return { remarks: await readRevisionRemarks(reader, actor.revisionId) };
  }),
);

export const POST = sealed(
  route({ role: 'public', params, body: guestRemarkRequestSchema }, async ({ params, body: { guest, ...remark } }) => {
    const { actor } = await openToken(params.token);
    await takeGuestWrite(actor.shareLinkId);
    const posted = await postRemark({ actor, guest }, actor.revisionId, remark);
    return answer(posted, { status: 201, headers: guestMarkHeader(guest.email) });
  }),
);
