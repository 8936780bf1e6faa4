import { z } from 'zod';
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

/** The job's own id and whom the mail is for. */
export interface Envelope {
  id: string;
  to: string;
}

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

export type TemplateName = keyof typeof TEMPLATES;
export type TemplateData<T extends TemplateName> = z.input<(typeof TEMPLATES)[T]['schema']>;

export function isTemplateName(name: string): name is TemplateName {
  return Object.hasOwn(TEMPLATES, name);
}
