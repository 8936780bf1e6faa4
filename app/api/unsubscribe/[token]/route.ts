import { z } from 'zod';
import { mailChoiceSchema } from '@/lib/contracts/mail-choices';
import { route } from '@/lib/server/http';
import { emailOfToken, mailChoiceOf, setMailChoice } from '@/lib/server/mail';
import { clientAddress, takeLinkAttempt } from '@/lib/server/rate-limit';
import { sealed } from '@/lib/server/share/sealed';

const params = z.object({ token: z.string().regex(/^[\w-]{44,400}$/) });
/** Without it the mail program has pressed the button: no more mails. */
const query = z.object({ choice: mailChoiceSchema.shape.choice.default('none') });

async function emailBehind(token: string, request: Request): Promise<string> {
  await takeLinkAttempt(clientAddress(request.headers));
  return emailOfToken(token);
}

export const GET = sealed(
  route({ role: 'public', params }, async ({ params, request }) => {
    const email = await emailBehind(params.token, request);
    return { email, choice: await mailChoiceOf(email) };
  }),
);

// RFC 8058: a mail program posts a form of its own here, from no page of ours; the body says nothing that the address does not.
export const POST = sealed(
  route({ role: 'public', params, query, fromAnywhere: true }, async ({ params, query, request }) => {
    const email = await emailBehind(params.token, request);
    await setMailChoice(email, query.choice);
    return { email, choice: query.choice };
  }),
);
