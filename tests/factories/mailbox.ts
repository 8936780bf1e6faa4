import type { AddressInfo } from 'node:net';
import { QueryTypes } from 'sequelize';
import { SMTPServer } from 'smtp-server';
import { sequelize } from '@/lib/server/database';
import { mailSchema } from '@/lib/server/jobs/mail';
import type { MailJob } from '@/lib/server/jobs';
import { QUEUE_SCHEMA } from '@/lib/server/queue';

export interface ReceivedMail {
  to: string[];
  /** Headers and parts with their transfer encoding undone. */
  source: string;
}

export interface Mailbox {
  url: string;
  mails: ReceivedMail[];
  /** While true every mail is turned away with 451. */
  refusing: boolean;
  close(): Promise<void>;
}

/** An SMTP server of the test's own, which keeps what it is given. */
export async function openMailbox(): Promise<Mailbox> {
  const mailbox: Mailbox = { url: '', mails: [], refusing: false, close: async () => undefined };
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    onData(stream, session, callback) {
      const chunks: Buffer[] = [];
      stream.on('data', (chunk: Buffer) => chunks.push(chunk));
      stream.on('end', () => {
        if (mailbox.refusing) return callback(Object.assign(new Error('Try later'), { responseCode: 451 }));
        const to = session.envelope.rcptTo.map((recipient) => recipient.address);
        mailbox.mails.push({ to, source: undoQuotedPrintable(Buffer.concat(chunks).toString('latin1')) });
        callback();
      });
    },
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  mailbox.url = `smtp://127.0.0.1:${(server.server.address() as AddressInfo).port}`;
  mailbox.close = () => new Promise((resolve) => server.close(() => resolve()));
  return mailbox;
}

function undoQuotedPrintable(source: string): string {
  const bytes = source
    .replace(/=\r\n/g, '')
    .replace(/=([0-9A-F]{2})/g, (_, code: string) => String.fromCharCode(parseInt(code, 16)));
  return Buffer.from(bytes, 'latin1').toString('utf8');
}

/** The mail jobs that wait for this person, oldest first. */
export async function queuedMails(to: string): Promise<MailJob[]> {
  const rows = await sequelize.query<{ data: unknown }>(
    `SELECT data FROM ${QUEUE_SCHEMA}.job WHERE name = 'mail' AND data ->> 'to' = $1 ORDER BY created_on`,
    { bind: [to], type: QueryTypes.SELECT },
  );
  return rows.map((row) => mailSchema.parse(row.data));
}
