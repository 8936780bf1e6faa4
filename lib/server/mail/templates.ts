import { z } from 'zod';
import type { Envelope } from './compose';
import type { Message } from './message';
import { composeInvitation } from './invitation';
import { composePasswordReset } from './password-reset';
import { composeIssue, composeSignOff, composeSignOffReceipt, issueDataSchema, signOffDataSchema } from './revision';
import {
  assignmentDataSchema,
  composeAssignment,
  composeMention,
  composeRemark,
  composeReply,
  remarkDataSchema,
  replyDataSchema,
} from './remark';

/** Null where there is nothing to send any more: an invitation withdrawn, an address without an account. */
type Compose<D> = (data: D, envelope: Envelope) => Promise<Message | null> | Message | null;

function template<S extends z.ZodType<Record<string, unknown>>>(schema: S, compose: Compose<z.output<S>>) {
  return {
    schema,
    compose: async (data: unknown, envelope: Envelope) => compose(schema.parse(data), envelope),
  };
}

/**
 * Every mail there is. Its data lies in the queue for a while, so it holds no token: links that are keys are made when the
 * mail is composed.
 */
export const TEMPLATES = {
  invitation: template(z.object({ invitationId: z.uuid() }), composeInvitation),
  'password-reset': template(z.object({}), composePasswordReset),
  remark: template(remarkDataSchema, composeRemark),
  reply: template(replyDataSchema, composeReply),
  mention: template(remarkDataSchema, composeMention),
  assignment: template(assignmentDataSchema, composeAssignment),
  issue: template(issueDataSchema, composeIssue),
  'sign-off': template(signOffDataSchema, composeSignOff),
  'sign-off-receipt': template(signOffDataSchema, composeSignOffReceipt),
};

/** What has to arrive whatever somebody chose: it was asked for, or it is a receipt. */
const ALWAYS: readonly TemplateName[] = ['invitation', 'password-reset', 'sign-off-receipt'];

export const mayBeChosen = (template: TemplateName): boolean => !ALWAYS.includes(template);

export type TemplateName = keyof typeof TEMPLATES;
export type TemplateData<T extends TemplateName> = z.input<(typeof TEMPLATES)[T]['schema']>;

export function isTemplateName(name: string): name is TemplateName {
  return Object.hasOwn(TEMPLATES, name);
}
