import nodemailer from 'nodemailer';
import type { Transporter } from 'nodemailer';
import { MailDelivery } from '@/models';
import { env } from '../env';
import type { MailJob } from '../jobs';
import { logger } from '../logger';
import { toHtml, toText } from './message';
import { unsubscribeAddress, unsubscribePage } from './choices';
import { composeMail } from './compose';
import { composeDigest, DIGEST } from './digest';
import { isTemplateName, mayBeChosen } from './templates';

let transporter: Transporter | null = null;

/**
 * The mail job's handler. Safe to repeat as far as SMTP allows: a mail that the server took is not sent again, and should we
 * die between its taking and our noting it, the second copy bears the same Message-ID, by which most readers fold the two.
 * Throws where the server does not take it, so that the queue tries again.
 */
export async function deliverMail(job: MailJob): Promise<void> {
  if (await MailDelivery.findByPk(job.id)) return;
  const envelope = { id: job.id, to: job.to };
  const isDigest = job.template === DIGEST;
  const message = isDigest ? await composeDigest(envelope) : await composeMail(job.template, job.data, envelope);
  if (!message) {
    logger.info({ mailId: job.id, template: job.template }, 'mail not needed any more');
    return;
  }
  const mayStop = isDigest || (isTemplateName(job.template) && mayBeChosen(job.template));
  const ending = mayStop ? { label: 'Choose how often you get such mails', url: unsubscribePage(job.to) } : null;
  transporter ??= nodemailer.createTransport(env.SMTP_URL);
  await transporter.sendMail({
    from: env.MAIL_FROM,
    to: job.to,
    // A line break in a name must not become a header of its own.
    subject: message.subject.replace(/\s+/g, ' '),
    text: toText(message, ending),
    html: toHtml(message, ending),
    messageId: `<${job.id}@${new URL(env.APP_URL).hostname}>`,
    // Answers of absent people are for nobody.
    headers: {
      'Auto-Submitted': 'auto-generated',
      // RFC 8058: the mail program itself can stop them, with one press.
      ...(mayStop && {
        'List-Unsubscribe': `<${unsubscribeAddress(job.to)}>`,
        'List-Unsubscribe-Post': 'List-Unsubscribe=One-Click',
      }),
    },
  });
  await MailDelivery.create({ id: job.id, template: job.template });
}
