import nodemailer from 'nodemailer';
import type { Transporter } from 'nodemailer';
import { MailDelivery } from '@/models';
import { env } from '../env';
import type { MailJob } from '../jobs';
import { logger } from '../logger';
import { toHtml, toText } from './message';
import { isTemplateName, TEMPLATES } from './templates';

let transporter: Transporter | null = null;

/**
 * The mail job's handler. Safe to repeat as far as SMTP allows: a mail that the server took is not sent again, and should we
 * die between its taking and our noting it, the second copy bears the same Message-ID, by which most readers fold the two.
 * Throws where the server does not take it, so that the queue tries again.
 */
export async function deliverMail(job: MailJob): Promise<void> {
  if (!isTemplateName(job.template)) throw new Error(`There is no mail template "${job.template}"`);
  if (await MailDelivery.findByPk(job.id)) return;
  const message = await TEMPLATES[job.template].compose(job.data, { id: job.id, to: job.to });
  if (!message) {
    logger.info({ mailId: job.id, template: job.template }, 'mail not needed any more');
    return;
  }
  transporter ??= nodemailer.createTransport(env.SMTP_URL);
  await transporter.sendMail({
    from: env.MAIL_FROM,
    to: job.to,
    // A line break in a name must not become a header of its own.
    subject: message.subject.replace(/\s+/g, ' '),
    text: toText(message),
    html: toHtml(message),
    messageId: `<${job.id}@${new URL(env.APP_URL).hostname}>`,
    // Answers of absent people are for nobody.
    headers: { 'Auto-Submitted': 'auto-generated' },
  });
  await MailDelivery.create({ id: job.id, template: job.template });
}
