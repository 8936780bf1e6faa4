import type { Guest } from '@/lib/contracts/remarks';
import type { AuthorSide } from '@/models';
import { forbidden } from '../errors';
import { actsAs, type Actor, type MemberActor, type ShareActor } from '../policy';
import { derivedToken } from '../tokens';

/** Somebody who writes: a member, or a guest of a share link who said who they are. */
export type Writer = { actor: MemberActor } | { actor: ShareActor; guest: Guest };

/** Somebody who reads. `guestMark` is what their browser was given when they last wrote as a guest. */
export interface Reader {
  readonly actor: Actor;
  readonly guestMark?: string | null;
}

/** Tells a guest's own remarks from those of others on the same link. It opens nothing, and it cannot be turned into an address. */
export const guestMarkOf = (email: string): string => derivedToken('guest', email);

export function writerName(writer: Writer): string {
  return 'guest' in writer ? writer.guest.name : writer.actor.name;
}

export function writerSide(writer: Writer): AuthorSide {
  return actsAs(writer.actor, 'planner') ? 'integrator' : 'customer';
}

/** The writer read back: their own remark is theirs. */
export function readerOf(writer: Writer): Reader {
  return 'guest' in writer ? { actor: writer.actor, guestMark: guestMarkOf(writer.guest.email) } : writer;
}

/** Throws 403 for a link that was made for reading only. */
export function demandMayRemark({ actor }: Writer): void {
  if (actor.kind === 'share' && !actor.mayRemark) {
    throw forbidden('This link is for reading only. Ask the person who sent it for one that takes remarks.');
  }
}

/** The columns that say who wrote. */
export function authorColumns(writer: Writer) {
  const authorSide = writerSide(writer);
  if (!('guest' in writer)) return { userId: writer.actor.userId, authorSide };
  const { guest, actor } = writer;
  return { guestName: guest.name, guestEmail: guest.email, shareLinkId: actor.shareLinkId, authorSide };
}
