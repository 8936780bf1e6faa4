import { z } from 'zod';
import { invitationAcceptSchema } from '@/lib/contracts/accounts';
import { route } from '@/lib/server/http';
import { acceptInvitation } from '@/lib/server/invitations/accept-invitation';
import { previewInvitation } from '@/lib/server/invitations/data';
import { clientAddress, takeLinkAttempt } from '@/lib/server/rate-limit';

const params = z.object({ token: z.string().max(200) });

export const GET = route({ role: 'public', params }, ({ params }) => previewInvitation(params.token));

export const POST = route(
  { role: 'public', params, body: invitationAcceptSchema },
  async ({ params, body, request }) => {
    await takeLinkAttempt(clientAddress(request.headers));
    await acceptInvitation(params.token, body);
  },
);
