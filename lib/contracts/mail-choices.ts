import { z } from 'zod';

/** How often somebody wants to hear of remarks, issues and sign-offs. Invitations and passwords come at once whatever it says. */
export const mailRhythmSchema = z.enum(['at_once', 'daily', 'none']);
export type MailRhythm = z.infer<typeof mailRhythmSchema>;

/** GET and PUT /api/account/mails, for oneself; GET and POST /api/unsubscribe/[token] for whom the link in a mail was made. */
export const mailChoiceSchema = z.object({ choice: mailRhythmSchema });
/** GET /api/unsubscribe/[token] */
export const unsubscribeStateSchema = mailChoiceSchema.extend({ email: z.string() });
