import type { Transaction } from 'sequelize';
import type { ApiToken as ApiTokenAnswer, ApiTokenRequest, NewApiToken } from '@/lib/contracts/api-tokens';
import { ApiToken, Membership } from '@/models';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { conflict, forbidden, invalid, notFound } from '../errors';
import { roleIsAtLeast, type MemberActor } from '../policy';
import { hashToken } from '../tokens';
import { hintOf, newTokenText } from './token-text';

const DAY_MS = 24 * 3600 * 1000;
const TOKENS_MAX = 50;

function present(token: ApiToken): ApiTokenAnswer {
  return {
    id: token.id,
    name: token.name,
    hint: token.hint,
    role: token.role,
    readOnly: token.readOnly,
    expiresAt: token.expiresAt.toISOString(),
    revokedAt: token.revokedAt?.toISOString() ?? null,
    lastUsedAt: token.lastUsedAt?.toISOString() ?? null,
    createdAt: token.createdAt.toISOString(),
  };
}

/** One's own, newest first. */
export async function listTokens(actor: MemberActor): Promise<ApiTokenAnswer[]> {
  const where = { membershipId: actor.membershipId };
  return (await ApiToken.findAll({ where, order: [['createdAt', 'DESC']] })).map(present);
}

/**
 * A new token. It is in this answer and nowhere else: only its hash is kept.
 * @throws 403 for a token that wants to make another one, 422 for a role above one's own.
 */
export async function createToken(
  actor: MemberActor,
  { name, role, readOnly, expiresInDays }: ApiTokenRequest,
  outer?: Transaction,
): Promise<NewApiToken> {
  if (actor.apiToken) throw forbidden('A token cannot make tokens. Sign in and make it on the page for API tokens.');
  if (!roleIsAtLeast(actor.role, role))
    throw invalid('role', 'A token may not do more than you. Choose a lesser role.');
  return inTransaction(async (transaction) => {
    const where = { membershipId: actor.membershipId, revokedAt: null };
    if ((await ApiToken.count({ where, transaction })) >= TOKENS_MAX) {
      throw conflict(
        'too_many_tokens',
        `You have ${TOKENS_MAX} tokens already. Take back one that is not used any more.`,
      );
    }
    const token = newTokenText();
    const row = await ApiToken.create(
      {
        membershipId: actor.membershipId,
        name,
        tokenHash: hashToken(token),
        hint: hintOf(token),
        role,
        readOnly,
        expiresAt: new Date(Date.now() + expiresInDays * DAY_MS),
      },
      { transaction },
    );
    const details = { name, role, readOnly, expiresInDays };
    await recordAudit(actor, { action: 'api_token.created', subjectId: row.id, details }, transaction);
    return { ...present(row), token };
  }, outer);
}

/** Takes a token back at once: one's own, and an admin anybody's in the organisation. Throws 404 otherwise. */
export async function revokeToken(actor: MemberActor, tokenId: string, outer?: Transaction): Promise<ApiTokenAnswer> {
  return inTransaction(async (transaction) => {
    const mine = roleIsAtLeast(actor.role, 'admin') ? {} : { id: actor.membershipId };
    const token = await ApiToken.findOne({
      where: { id: tokenId },
      include: [
        {
          model: Membership,
          as: 'membership',
          required: true,
          where: { organisationId: actor.organisationId, ...mine },
        },
      ],
      lock: { level: transaction.LOCK.UPDATE, of: ApiToken },
      transaction,
    });
    if (!token) throw notFound('token');
    if (!token.revokedAt) {
      await token.update({ revokedAt: new Date() }, { transaction });
      const details = { name: token.name };
      await recordAudit(actor, { action: 'api_token.revoked', subjectId: tokenId, details }, transaction);
    }
    return present(token);
  }, outer);
}
