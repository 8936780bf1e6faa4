import { z } from 'zod';
import { idSchema } from '@/lib/contracts/common';
import { answer, route } from '@/lib/server/http';
import { takeGuestWrite } from '@/lib/server/rate-limit';
import { attachPicture } from '@/lib/server/remarks/pictures';
import { openToken } from '@/lib/server/share/data';
import { readGuestMark } from '@/lib/server/share/guest-mark';
import { sealed, tokenParam } from '@/lib/server/share/sealed';

const params = z.object({ token: tokenParam, remarkId: idSchema });

export const POST = sealed(
  route({ role: 'public', params, body: 'stream' }, async ({ params, request }) => {
    const { actor } = await openToken(params.token);
    await takeGuestWrite(actor.shareLinkId);
    const reader = { actor, guestMark: readGuestMark(request) };
    return answer(await attachPicture(reader, params.remarkId, request), { status: 201 });
  }),
);
