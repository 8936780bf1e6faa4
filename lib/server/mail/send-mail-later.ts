import { randomUUID } from 'node:crypto';
import type { Transaction } from '../database';
import { mailJob } from '../jobs';
import { enqueue } from '../queue';
import { TEMPLATES } from './templates';
import type { TemplateData, TemplateName } from './templates';

interface MailOrder<T extends TemplateName> {
  to: string;
  template: T;
  data: TemplateData<T>;
}

/** Queues a mail with the transaction of what it tells of: rolled back, it is never sent. Throws ZodError for data that does not fit. */
export async function sendMailLater<T extends TemplateName>(
  order: MailOrder<T>,
  transaction: Transaction,
): Promise<void> {
  const data = TEMPLATES[order.template].schema.parse(order.data);
  await enqueue(mailJob, { id: randomUUID(), to: order.to, template: order.template, data }, { transaction });
}
