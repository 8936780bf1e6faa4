import { Op, type Transaction } from 'sequelize';
import { Layout, Project, Revision, ShareLink, ShareOpen } from '@/models';
import { notFound } from '../errors';
import { projectScope, type MemberActor, type ShareActor } from '../policy';
import { hashToken } from '../tokens';

/** A link that is opened every day for a year need not fill the dialog. */
const SHOWN_OPENS = 20;

const aroundLink = (where?: ReturnType<typeof projectScope>) => ({
  model: Revision,
  as: 'revision',
  required: true,
  attributes: { exclude: ['snapshot'] },
  include: [
    {
      model: Layout,
      as: 'layout',
      required: true,
      include: [{ model: Project, as: 'project', required: true, ...(where && { where }) }],
    },
  ],
});

/**
 * Who holds this token. The token itself is the proof of access, so this one query is not scoped by an organisation. Throws
 * not_found for a token that is unknown, expired or revoked alike.
 */
export async function openToken(
  token: string,
  transaction?: Transaction,
): Promise<{ actor: ShareActor; link: ShareLink }> {
  const link = await ShareLink.findOne({
    where: { tokenHash: hashToken(token), revokedAt: null, expiresAt: { [Op.gt]: new Date() } },
    include: [aroundLink()],
    transaction,
  });
  const project = link?.revision?.layout?.project;
  if (!link || !project) throw notFound('link');
  const actor: ShareActor = {
    kind: 'share',
    shareLinkId: link.id,
    organisationId: project.organisationId,
    projectId: project.id,
    revisionId: link.revisionId,
    mayRemark: link.mayRemark,
    maySign: link.maySign,
  };
  return { actor, link };
}

/** A link of the member's organisation, held until the transaction ends. Throws not_found. */
export async function findShareLink(
  actor: MemberActor,
  shareLinkId: string,
  transaction: Transaction,
): Promise<ShareLink> {
  const link = await ShareLink.findOne({
    where: { id: shareLinkId },
    include: [aroundLink(projectScope(actor))],
    lock: { level: transaction.LOCK.UPDATE, of: ShareLink },
    transaction,
  });
  if (!link) throw notFound('share link');
  return link;
}

/** The links to a revision that the caller has already been let at, newest first. */
export async function shareLinksOf(revisionId: string, transaction?: Transaction): Promise<ShareLink[]> {
  return ShareLink.findAll({
    where: { revisionId },
    // Apart, or the limit would count the rows of the join.
    include: [{ model: ShareOpen, as: 'opens', separate: true, order: [['createdAt', 'DESC']], limit: SHOWN_OPENS }],
    order: [
      ['createdAt', 'DESC'],
      ['id', 'ASC'],
    ],
    transaction,
  });
}
