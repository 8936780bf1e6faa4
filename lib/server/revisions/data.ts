import { Op, type Includeable, type Transaction } from 'sequelize';
import { Layout, Project, Revision, SignOff, User } from '@/models';
import { notFound } from '../errors';
import { projectScope, type Actor } from '../policy';

/** A revision with its layout, the project around it and whoever issued it. */
export type PlacedRevision = Revision & { layout: Layout & { project: Project } };

const around = (actor: Actor): Includeable[] => [
  {
    model: Layout,
    as: 'layout',
    required: true,
    include: [{ model: Project, as: 'project', required: true, where: projectScope(actor) }],
  },
  { model: User, as: 'issuer' },
  { model: SignOff, as: 'signOffs' },
];

const signOffsInOrder: [string, string, string] = ['signOffs', 'createdAt', 'ASC'];

/** The revision if the actor may see it; a guest sees the shared one only. Throws not_found. */
export async function findRevision(
  actor: Actor,
  revisionId: string,
  transaction?: Transaction,
): Promise<PlacedRevision> {
  const shared = actor.kind === 'share' ? { id: actor.revisionId } : {};
  const revision = await Revision.findOne({
    where: { [Op.and]: [{ id: revisionId }, shared] },
    include: around(actor),
    order: [signOffsInOrder],
    transaction,
  });
  if (!revision) throw notFound('revision');
  return revision as PlacedRevision;
}

/** The revisions of a layout that the caller has already been let at, newest first, without their snapshots. */
export async function revisionsOf(layout: Layout, transaction?: Transaction): Promise<Revision[]> {
  return Revision.findAll({
    where: { layoutId: layout.id },
    attributes: { exclude: ['snapshot'] },
    include: [
      { model: User, as: 'issuer' },
      { model: SignOff, as: 'signOffs' },
    ],
    order: [['number', 'DESC'], signOffsInOrder],
    transaction,
  });
}
