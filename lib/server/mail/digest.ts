import { createHash } from 'node:crypto';
import { Op, type Transaction } from 'sequelize';
import { DigestEntry } from '@/models';
import { mailJob } from '../jobs';
import { enqueue } from '../queue';
import type { Message } from './message';
import { composeMail, type Envelope } from './compose';

/** The name of the daily mail in the queue; it has no data of its own. */
export const DIGEST = 'digest';

/** The daily mail goes out at this hour, UTC: before the working day of most of those who get it. */
const DIGEST_HOUR_UTC = 5;

export function nextDigest(now: Date): Date {
  const next = new Date(now);
  next.setUTCHours(DIGEST_HOUR_UTC, 0, 0, 0);
  if (next <= now) next.setUTCDate(next.getUTCDate() + 1);
  return next;
}

/** The same for one address and day, so that however many entries ask for it there is one mail. */
function digestId(email: string, at: Date): string {
  const hex = createHash('sha256').update(`digest ${email} ${at.toISOString()}`).digest('hex');
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-4${hex.slice(13, 16)}-8${hex.slice(17, 20)}-${hex.slice(20, 32)}`;
}

interface Entry {
  readonly id: string;
  readonly email: string;
  readonly template: string;
  readonly data: Record<string, unknown>;
}

/** Keeps a mail for the next daily one, and asks for that. */
export async function keepForDigest(entry: Entry, transaction: Transaction, now = new Date()): Promise<void> {
  await DigestEntry.create(entry, { transaction });
  const startAfter = nextDigest(now);
  const job = { id: digestId(entry.email, startAfter), to: entry.email, template: DIGEST, data: {} };
  // Asking again for the same one would queue it twice; delivery by its id would still send it once.
  await enqueue(mailJob, job, { transaction, startAfter });
}

/** All that waits for this address, set one below another; null where nothing does. */
export async function composeDigest({ id, to }: Envelope): Promise<Message | null> {
  // Taken by this mail for good: a later attempt sends the same ones, and no other mail does.
  await DigestEntry.update({ digestId: id }, { where: { email: to, digestId: null } });
  const entries = await DigestEntry.findAll({
    where: { email: to, digestId: { [Op.eq]: id } },
    order: [
      ['createdAt', 'ASC'],
      ['id', 'ASC'],
    ],
  });
  const parts: Message[] = [];
  for (const entry of entries) {
    const part = await composeMail(entry.template, entry.data, { id: entry.id, to });
    if (part) parts.push(part);
  }
  if (parts.length === 0) return null;
  return {
    subject: parts.length === 1 ? parts[0].subject : `${parts.length} things happened on Elbowroom`,
    paragraphs: [],
    parts,
    reason: 'You get this mail once a day, because you chose so.',
  };
}
