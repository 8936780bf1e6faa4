import { AuditEvent } from '@/models';
import type { Transaction } from './database';
import type { Actor } from './policy';

interface AuditEntry {
  /** Subject and deed in the past tense: `member.removed`, `revision.issued`. */
  action: `${string}.${string}`;
  subjectId?: string;
  /** Plain facts for the reader; never a token or a password. */
  details?: Record<string, unknown>;
}

/** Writes down who did what, in the transaction of the deed: both are kept or neither is. */
export async function recordAudit(actor: Actor, entry: AuditEntry, transaction: Transaction): Promise<void> {
  const who = actor.kind === 'member' ? { userId: actor.userId } : { shareLinkId: actor.shareLinkId };
  // A program's deed is its owner's, but the reader must be able to tell the two apart.
  const token = actor.kind === 'member' && actor.apiToken ? { apiTokenId: actor.apiToken.id } : null;
  const details = { ...entry.details, ...token };
  await AuditEvent.create({ organisationId: actor.organisationId, ...who, ...entry, details }, { transaction });
}
