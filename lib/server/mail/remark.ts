import { z } from 'zod';
import { env } from '../env';
import type { Message } from './message';

const subjectSchema = z.object({
  projectName: z.string(),
  /** As the title block names it: "A · U-shaped cell". */
  layoutTitle: z.string(),
  revisionNumber: z.number().int(),
  remarkNumber: z.number().int(),
  authorName: z.string(),
  body: z.string(),
  /**
   * Path of the page to read it on, from the root: "/revisions/…". Null for a guest, whose share link we cannot repeat
   * because we do not keep it.
   */
  path: z.string().startsWith('/').nullable(),
});
type Subject = z.output<typeof subjectSchema>;

export const remarkDataSchema = subjectSchema;
export const replyDataSchema = subjectSchema;

export function composeRemark(subject: Subject): Message {
  const { authorName, remarkNumber, projectName } = subject;
  return {
    subject: `Remark ${remarkNumber} by ${authorName}: ${projectName}`,
    paragraphs: [`${authorName} pinned remark ${remarkNumber} to ${placeOf(subject)}.`],
    ...rest(subject, 'You get this mail because you planned or issued this layout.'),
  };
}

export function composeReply(subject: Subject): Message {
  const { authorName, remarkNumber, projectName } = subject;
  return {
    subject: `Reply by ${authorName} to remark ${remarkNumber}: ${projectName}`,
    paragraphs: [`${authorName} answered remark ${remarkNumber} on ${placeOf(subject)}.`],
    ...rest(subject, 'You get this mail because you take part in this remark or planned this layout.'),
  };
}

export const assignmentDataSchema = subjectSchema.extend({ dueOn: z.string().nullable() });

export function composeMention(subject: Subject): Message {
  const { authorName, remarkNumber, projectName } = subject;
  return {
    subject: `${authorName} names you in remark ${remarkNumber}: ${projectName}`,
    paragraphs: [`${authorName} names you in remark ${remarkNumber} on ${placeOf(subject)}.`],
    ...rest(subject, 'You get this mail because somebody named you in a remark.'),
  };
}

export function composeAssignment(subject: z.output<typeof assignmentDataSchema>): Message {
  const { authorName, remarkNumber, projectName, dueOn } = subject;
  const until = dueOn ? ` It is due on ${dueOn}.` : '';
  return {
    subject: `Remark ${remarkNumber} is yours: ${projectName}`,
    paragraphs: [`${authorName} gave you remark ${remarkNumber} on ${placeOf(subject)}.${until}`],
    ...rest(subject, 'You get this mail because a remark was given to you.'),
  };
}

function placeOf({ projectName, layoutTitle, revisionNumber }: Subject): string {
  return `${projectName}, layout ${layoutTitle}, revision ${revisionNumber}`;
}

function rest({ body, path }: Subject, reason: string): Pick<Message, 'quote' | 'action' | 'reason'> {
  if (path) return { quote: body, action: { label: 'Open it', url: `${env.APP_URL}${path}` }, reason };
  return { quote: body, reason: `${reason} To answer, open the link that you were sent.` };
}
