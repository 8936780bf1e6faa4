import { literal, Op, type Includeable, type Transaction, type WhereOptions } from 'sequelize';
import { Layout, Project, Remark, RemarkReply, Revision, User } from '@/models';
import { notFound } from '../errors';
import { projectScope, type Actor } from '../policy';

/**
 * A remark with its revision (without the snapshot, but with the name that the layout was issued under), the layout and
 * project around it, its author and its replies.
 */
export type PlacedRemark = Remark & {
  revision: Revision & { layout: Layout & { project: Project } };
  replies: RemarkReply[];
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
];

/** A guest sees the remarks on the shared revision only. */
const sharedOnly = (actor: Actor): WhereOptions<Remark> =>
  actor.kind === 'share' ? { revisionId: actor.revisionId } : {};

const repliesInOrder: [string, string, string][] = [
  ['replies', 'createdAt', 'ASC'],
  ['replies', 'id', 'ASC'],
];

/** Remarks within a layout or a revision, as far as the actor may see them, in the order of their numbers. */
export async function listRemarks(
  actor: Actor,
  within: { layoutId: string } | { revisionId: string },
  transaction?: Transaction,
): Promise<PlacedRemark[]> {
  const remarks = await Remark.findAll({
    where: { [Op.and]: [within, sharedOnly(actor)] },
    include: around(actor),
    order: [['number', 'ASC'], ...repliesInOrder],
    transaction,
  });
  return remarks as PlacedRemark[];
}

/** The remark if the actor may see it. Throws not_found. */
export async function findRemark(actor: Actor, remarkId: string, transaction?: Transaction): Promise<PlacedRemark> {
  const remark = await Remark.findOne({
    where: { [Op.and]: [{ id: remarkId }, sharedOnly(actor)] },
    include: around(actor),
    order: repliesInOrder,
    transaction,
  });
  if (!remark) throw notFound('remark');
  return remark as PlacedRemark;
}
