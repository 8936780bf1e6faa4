import { randomUUID } from 'node:crypto';
import type { Transaction } from '../database';
import { mailJob } from '../jobs';
import { enqueue } from '../queue';
import { mailChoiceOf } from './choices';
import { keepForDigest } from './digest';
import { mayBeChosen, TEMPLATES } from './templates';
import type { TemplateData, TemplateName } from './templates';

interface MailOrder<T extends TemplateName> {
  to: string;
  template: T;
  data: TemplateData<T>;
}

/**
 * Queues a mail with the transaction of what it tells of: rolled back, it is never sent. Somebody who chose a daily mail gets it in
 * that, somebody who chose none does not get it. Throws ZodError for data that does not fit.
 */
export async function sendMailLater<T extends TemplateName>(
  order: MailOrder<T>,
  transaction: Transaction,
): Promise<void> {
  const data = TEMPLATES[order.template].schema.parse(order.data);
  const { to, template } = order;
  const id = randomUUID();
  const choice = mayBeChosen(template) ? await mailChoiceOf(to, transaction) : 'at_once';
  if (choice === 'none') return;
  if (choice === 'daily') return keepForDigest({ id, email: to.toLowerCase(), template, data }, transaction);
  await enqueue(mailJob, { id, to, template, data }, { transaction });
}
