import { Op } from 'sequelize';
import { ApiToken, Membership, ProjectViewer, User } from '@/models';
import { lesserRole, type MemberActor } from '../policy';
import { presentActor } from '../session/present-actor';
import { hashToken } from '../tokens';
import { looksLikeToken } from './token-text';

/** How exactly the last use is kept: a write for every request would only wear the database out. */
const LAST_USED_STEP_MS = 60_000;

/**
 * Who acts under a token, with no more than the token's role and no more than its owner has now; null for one that is unknown, over
 * or taken back.
 */
export async function actorOfToken(token: string): Promise<MemberActor | null> {
  if (!looksLikeToken(token)) return null;
  const row = await ApiToken.findOne({
    where: { tokenHash: hashToken(token), revokedAt: null, expiresAt: { [Op.gt]: new Date() } },
    include: [
      {
        model: Membership,
        as: 'membership',
        required: true,
        include: [
          { model: User, as: 'user', required: true },
          { model: ProjectViewer, as: 'projectViewers' },
        ],
      },
    ],
  });
  if (!row?.membership) return null;
  await noteUse(row);
  const owner = presentActor(row.membership);
  const role = lesserRole(row.role, owner.role);
  // A viewer's token of a member who sees every project still sees every project, but only what is issued in it.
  return { ...owner, role, apiToken: { id: row.id, readOnly: row.readOnly } };
}

async function noteUse({ id, lastUsedAt }: ApiToken): Promise<void> {
  if (lastUsedAt && Date.now() - lastUsedAt.getTime() < LAST_USED_STEP_MS) return;
  await ApiToken.update({ lastUsedAt: new Date() }, { where: { id }, silent: true });
}
