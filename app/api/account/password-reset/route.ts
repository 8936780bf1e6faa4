import { passwordResetRequestSchema } from '@/lib/contracts/accounts';
import { requestPasswordReset } from '@/lib/server/accounts/request-password-reset';
import { answer, route } from '@/lib/server/http';
import { clientAddress } from '@/lib/server/rate-limit';

export const POST = route({ role: 'public', body: passwordResetRequestSchema }, async ({ body, request }) => {
  await requestPasswordReset(body.email, clientAddress(request.headers));
  return answer(undefined, { status: 202 });
});
