import { timingSafeEqual } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { MailRhythm } from '@/lib/contracts/mail-choices';
import { MailChoice } from '@/models';
import { env } from '../env';
import { linkNotValid } from '../errors';
import { derivedToken } from '../tokens';

/** How often this address wants mail; each at once unless it has said otherwise. */
export async function mailChoiceOf(email: string, transaction?: Transaction): Promise<MailRhythm> {
  const row = await MailChoice.findByPk(email.toLowerCase(), { transaction });
  return row?.choice ?? 'at_once';
}

export async function setMailChoice(email: string, choice: MailRhythm): Promise<void> {
  await MailChoice.upsert({ email: email.toLowerCase(), choice });
}

const MAC_LENGTH = 43;

/**
 * What lets the reader of a mail change its rhythm without signing in: it names the address, and only we can make it. It opens
 * nothing else.
 */
export function unsubscribeToken(email: string): string {
  const address = email.toLowerCase();
  return derivedToken('unsubscribe', address) + Buffer.from(address).toString('base64url');
}

/** Throws 404 for a token that is not ours. */
export function emailOfToken(token: string): string {
  const email = Buffer.from(token.slice(MAC_LENGTH), 'base64url').toString();
  const expected = Buffer.from(unsubscribeToken(email));
  const given = Buffer.from(token);
  if (!email || expected.length !== given.length || !timingSafeEqual(expected, given)) throw linkNotValid();
  return email;
}

export const unsubscribePage = (email: string): string => `${env.APP_URL}/unsubscribe/${unsubscribeToken(email)}`;
/** Mail programs post to it (RFC 8058); people are sent to the page. */
export const unsubscribeAddress = (email: string): string =>
  `${env.APP_URL}/api/unsubscribe/${unsubscribeToken(email)}`;
