import { z } from 'zod';
import { signOffDecisionSchema } from '@/lib/contracts/sign-offs';
import { env } from '../env';
import type { Message } from './message';

const subjectSchema = z.object({
  projectName: z.string(),
  /** As the title block names it: "A · U-shaped cell". */
  layoutTitle: z.string(),
  revisionNumber: z.number().int(),
  note: z.string(),
  /** From the root; null for a guest, whose share link we do not keep. */
  path: z.string().startsWith('/').nullable(),
});

export const issueDataSchema = subjectSchema.extend({ issuerName: z.string() });

export const signOffDataSchema = subjectSchema.extend({
  decision: signOffDecisionSchema,
  signerName: z.string(),
  signedAt: z.string(),
  sha256: z.string(),
});
type SignOffSubject = z.output<typeof signOffDataSchema>;
type Subject = z.output<typeof subjectSchema>;

export function composeIssue(subject: z.output<typeof issueDataSchema>): Message {
  const { issuerName, projectName, revisionNumber } = subject;
  return {
    subject: `Revision ${revisionNumber} for review: ${projectName}`,
    paragraphs: [`${issuerName} issued ${placeOf(subject)} for review.`],
    ...rest(subject, 'You get this mail because you plan, review or have remarked on this layout.'),
  };
}

export function composeSignOff(subject: SignOffSubject): Message {
  const { signerName, decision, projectName, revisionNumber } = subject;
  const deed = decision === 'accepted' ? 'accepted' : 'asked for changes to';
  return {
    subject: `${signerName} ${deed} revision ${revisionNumber}: ${projectName}`,
    paragraphs: [`${signerName} ${deed} ${placeOf(subject)}, on ${momentOf(subject)}.`],
    ...rest(subject, 'You get this mail because you plan, review or have remarked on this layout.'),
  };
}

/** What the signer keeps: what they said, when, and to exactly which content. */
export function composeSignOffReceipt(subject: SignOffSubject): Message {
  const { decision, projectName, revisionNumber, sha256 } = subject;
  const deed = decision === 'accepted' ? 'accepted' : 'asked for changes to';
  return {
    subject: `You ${deed} revision ${revisionNumber}: ${projectName}`,
    paragraphs: [
      `You ${deed} ${placeOf(subject)}, on ${momentOf(subject)}.`,
      `What you saw is kept unchanged. Its SHA-256: ${sha256}`,
    ],
    ...rest(
      subject,
      'You get this mail because you signed. If it was not you, answer the person who sent you the link.',
    ),
  };
}

function placeOf({ projectName, layoutTitle, revisionNumber }: Subject): string {
  return `${projectName}, layout ${layoutTitle}, revision ${revisionNumber}`;
}

/** Mails are read in other time zones than ours. */
function momentOf({ signedAt }: SignOffSubject): string {
  return `${signedAt.slice(0, 10)} at ${signedAt.slice(11, 16)} UTC`;
}

function rest({ note, path }: Subject, reason: string): Pick<Message, 'quote' | 'action' | 'reason'> {
  const quote = note ? { quote: note } : {};
  if (path) return { ...quote, action: { label: 'Open the revision', url: `${env.APP_URL}${path}` }, reason };
  return { ...quote, reason: `${reason} To see it, open the link that you are sent for it.` };
}
