import type { Transaction } from 'sequelize';
import { Remark, RemarkReply, ShareOpen, SignOff, type Device } from '@/models';
import { guestMarkOf } from '../remarks/author';

/** What asks, as far as its own word goes; good enough to tell a phone in the hall from a desk. */
export function deviceOf(userAgent: string | null): Device {
  if (!userAgent || !/mozilla/i.test(userAgent) || /bot|crawl|spider|preview|scan/i.test(userAgent)) return 'program';
  if (/ipad|tablet|android(?!.*mobile)/i.test(userAgent)) return 'tablet';
  return /mobile|iphone|android/i.test(userAgent) ? 'phone' : 'computer';
}

/** The guest of this link whose browser bears the mark; the mark itself cannot be turned back into an address. */
async function guestBehind(shareLinkId: string, mark: string, transaction: Transaction) {
  const options = { where: { shareLinkId }, transaction };
  const people = [
    ...(await Remark.findAll(options)).map(({ guestName, guestEmail }) => [guestName, guestEmail]),
    ...(await RemarkReply.findAll(options)).map(({ guestName, guestEmail }) => [guestName, guestEmail]),
    ...(await SignOff.findAll(options)).map(({ signerName, signerEmail }) => [signerName, signerEmail]),
  ];
  const found = people.find(([, email]) => email && guestMarkOf(email) === mark);
  return found ? { guestName: found[0], guestEmail: found[1] } : {};
}

/** Writes down that the link was opened: when, on what, and by whom as far as that is known. */
export async function recordOpen(
  shareLinkId: string,
  { userAgent, guestMark }: { userAgent: string | null; guestMark: string | null },
  transaction: Transaction,
): Promise<void> {
  const who = guestMark ? await guestBehind(shareLinkId, guestMark, transaction) : {};
  await ShareOpen.create({ shareLinkId, device: deviceOf(userAgent), ...who }, { transaction });
}
