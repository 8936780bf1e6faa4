import type { Transaction } from 'sequelize';
import type { z } from 'zod';
import { ShareLink } from '@/models';
import type { newShareLinkSchema, ShareLink as ShareLinkAnswer, ShareLinkRequest } from '@/lib/contracts/share-links';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { env } from '../env';
import type { MemberActor } from '../policy';
import { findRevision } from '../revisions/data';
import { hashToken, randomToken } from '../tokens';
import { findShareLink, shareLinksOf } from './data';
import { presentShareLink } from './present';

const DAY_MS = 24 * 3600 * 1000;

/** A new link to a revision. Its address is in this answer and nowhere else: only the token's hash is kept. */
export async function createShareLink(
  actor: MemberActor,
  revisionId: string,
  { label, mayRemark, maySign, expiresInDays }: ShareLinkRequest,
  outer?: Transaction,
): Promise<z.infer<typeof newShareLinkSchema>> {
  return inTransaction(async (transaction) => {
    await findRevision(actor, revisionId, transaction);
    const token = randomToken();
    const link = await ShareLink.create(
      {
        revisionId,
        tokenHash: hashToken(token),
        label,
        mayRemark,
        maySign,
        expiresAt: new Date(Date.now() + expiresInDays * DAY_MS),
        createdBy: actor.userId,
      },
      { transaction },
    );
    await recordAudit(
      actor,
      { action: 'share_link.created', subjectId: link.id, details: { revisionId, mayRemark, maySign } },
      transaction,
    );
    return { ...presentShareLink(link), url: new URL(`/share/${token}`, env.APP_URL).href };
  }, outer);
}

export async function listShareLinks(
  actor: MemberActor,
  revisionId: string,
  transaction?: Transaction,
): Promise<ShareLinkAnswer[]> {
  await findRevision(actor, revisionId, transaction);
  return (await shareLinksOf(revisionId, transaction)).map(presentShareLink);
}

/** Ends a link at once; one that was revoked before keeps its first date. */
export async function revokeShareLink(
  actor: MemberActor,
  shareLinkId: string,
  outer?: Transaction,
): Promise<ShareLinkAnswer> {
  return inTransaction(async (transaction) => {
    const link = await findShareLink(actor, shareLinkId, transaction);
    if (!link.revokedAt) {
      await link.update({ revokedAt: new Date() }, { transaction });
      await recordAudit(actor, { action: 'share_link.revoked', subjectId: link.id }, transaction);
    }
    return presentShareLink(link);
  }, outer);
}
