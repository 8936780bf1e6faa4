import { z } from 'zod';
import { passwordResetSchema } from '@/lib/contracts/accounts';
import { resetPassword } from '@/lib/server/accounts/reset-password';
import { route } from '@/lib/server/http';
import { clientAddress, takeLinkAttempt } from '@/lib/server/rate-limit';

const params = z.object({ token: z.string().max(200) });

export const POST = route({ role: 'public', params, body: passwordResetSchema }, async ({ params, body, request }) => {
  await takeLinkAttempt(clientAddress(request.headers));
  await resetPassword(params.token, body.password);
});
