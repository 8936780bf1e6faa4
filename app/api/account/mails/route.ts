import { mailChoiceSchema } from '@/lib/contracts/mail-choices';
import { route } from '@/lib/server/http';
import { mailChoiceOf, setMailChoice } from '@/lib/server/mail';

export const GET = route({ role: 'viewer' }, async ({ actor }) => ({ choice: await mailChoiceOf(actor.email) }));

export const PUT = route({ role: 'viewer', body: mailChoiceSchema }, async ({ actor, body }) => {
  await setMailChoice(actor.email, body.choice);
  return body;
});
