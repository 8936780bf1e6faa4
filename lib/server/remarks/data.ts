import { literal, Op, type Includeable, type Transaction, type WhereOptions } from 'sequelize';
import {
  Layout,
  Project,
  Remark,
  RemarkMention,
  RemarkPicture,
  RemarkRead,
  RemarkReply,
  Revision,
  User,
} from '@/models';
import { notFound } from '../errors';
import { projectScope, type Actor } from '../policy';

/**
 * A remark with its revision (without the snapshot, but with the name that the layout was issued under), the layout and
 * project around it, its author and its replies.
 */
export type PlacedRemark = Remark & {
  revision: Revision & { layout: Layout & { project: Project } };
  replies: RemarkReply[];
  mentions: RemarkMention[];
  pictures: RemarkPicture[];
  /** Of the reader only; none for a guest. */
  reads: RemarkRead[];
};

/** The letter and name that the remark's readers know the layout by: those of the revision, whatever it is called now. */
export function issuedTitle({ revision }: PlacedRemark): string {
  return `${revision.layout.letter} · ${String(revision.get('issuedName' as keyof Revision))}`;
}

const around = (actor: Actor): Includeable[] => [
  {
    model: Revision,
    as: 'revision',
    required: true,
    attributes: { exclude: ['snapshot'], include: [[literal(`"revision".snapshot ->> 'name'`), 'issuedName']] },
    include: [
      {
        model: Layout,
        as: 'layout',
        required: true,
        include: [{ model: Project, as: 'project', required: true, where: projectScope(actor) }],
      },
    ],
  },
  { model: User, as: 'user' },
  { model: RemarkReply, as: 'replies', include: [{ model: User, as: 'user' }] },
  { model: User, as: 'assignee' },
  { model: RemarkMention, as: 'mentions', separate: true, include: [{ model: User, as: 'user' }] },
  { model: RemarkPicture, as: 'pictures', separate: true, order: [['createdAt', 'ASC']] },
  {
    model: RemarkRead,
    as: 'reads',
    required: false,
    where: actor.kind === 'member' ? { userId: actor.userId } : literal('false'),
  },
];

/**
 * What a reader of one revision has before them: its own remarks, and those that were carried forward to it, which are the
 * remarks on earlier revisions of the layout that were still open when it was issued.
 */
async function seenOn(revisionId: string, transaction?: Transaction): Promise<WhereOptions<Remark>> {
  const revision = await Revision.findByPk(revisionId, {
    attributes: ['id', 'layoutId', 'number', 'createdAt'],
    rejectOnEmpty: true,
    transaction,
  });
  return {
    [Op.or]: [
      { revisionId },
      {
        layoutId: revision.layoutId,
        '$revision.number$': { [Op.lt]: revision.number },
        createdAt: { [Op.lte]: revision.createdAt },
        resolvedAt: { [Op.or]: [null, { [Op.gt]: revision.createdAt }] },
      },
    ],
  };
}

/** A guest sees the remarks that belong to the shared revision only. */
const sharedOnly = async (actor: Actor, transaction?: Transaction): Promise<WhereOptions<Remark>> =>
  actor.kind === 'share' ? seenOn(actor.revisionId, transaction) : {};

const repliesInOrder: [string, string, string][] = [
  ['replies', 'createdAt', 'ASC'],
  ['replies', 'id', 'ASC'],
];

/** Remarks within a project, a layout or a revision, as far as the actor may see them, in the order of their numbers. */
export async function listRemarks(
  actor: Actor,
  within: { projectId: string } | { layoutId: string } | { revisionId: string },
  transaction?: Transaction,
): Promise<PlacedRemark[]> {
  const place =
    'revisionId' in within
      ? await seenOn(within.revisionId, transaction)
      : 'projectId' in within
        ? { '$revision.layout.project_id$': within.projectId }
        : within;
  const remarks = await Remark.findAll({
    where: { [Op.and]: [place, await sharedOnly(actor, transaction)] },
    include: around(actor),
    order: [['number', 'ASC'], ...repliesInOrder],
    transaction,
  });
  return remarks as PlacedRemark[];
}

/** The remark if the actor may see it. Throws not_found. */
export async function findRemark(actor: Actor, remarkId: string, transaction?: Transaction): Promise<PlacedRemark> {
  const remark = await Remark.findOne({
    // The bare id keeps Sequelize from a limit, and so from a subquery that would not know the revision's columns.
    where: { id: remarkId, [Op.and]: [await sharedOnly(actor, transaction)] },
    include: around(actor),
    order: repliesInOrder,
    transaction,
  });
  if (!remark) throw notFound('remark');
  return remark as PlacedRemark;
}
