import type { Message } from './message';
import { isTemplateName, TEMPLATES } from './templates';

/** The job's own id and whom the mail is for. */
export interface Envelope {
  id: string;
  to: string;
}

/** Fills a template; null where there is nothing to send any more. Throws for a template that does not exist. */
export async function composeMail(template: string, data: unknown, envelope: Envelope): Promise<Message | null> {
  if (!isTemplateName(template)) throw new Error(`There is no mail template "${template}"`);
  return TEMPLATES[template].compose(data, envelope);
}
