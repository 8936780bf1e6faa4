import type { Transaction } from 'sequelize';
import type { Comparison as ComparisonAnswer, ComparisonRequest } from '@/lib/contracts/comparisons';
import { Comparison, Layout, Project, Revision, User } from '@/models';
import { inTransaction } from '../database';
import { invalid, notFound } from '../errors';
import { projectScope, seesDrafts, type MemberActor } from '../policy';
import { findProject } from '../projects/data';

const present = ({ id, name, sheets, view, author, createdAt }: Comparison): ComparisonAnswer => ({
  id,
  name,
  sheets,
  view,
  createdBy: author?.name ?? 'a former member',
  createdAt: createdAt.toISOString(),
});

/** Newest first. Viewers get those of issued revisions only: a draft is nothing to them. */
export async function listComparisons(
  actor: MemberActor,
  projectId: string,
  transaction?: Transaction,
): Promise<ComparisonAnswer[]> {
  const project = await findProject(actor, projectId, transaction);
  const rows = await Comparison.findAll({
    where: { projectId: project.id },
    include: [{ model: User, as: 'author' }],
    order: [
      ['createdAt', 'DESC'],
      ['id', 'ASC'],
    ],
    transaction,
  });
  const seen = seesDrafts(actor)
    ? rows
    : rows.filter(({ sheets }) => sheets.every((ref) => ref.startsWith('revision:')));
  return seen.map(present);
}

async function demandSheets(projectId: string, sheets: readonly string[], transaction: Transaction): Promise<void> {
  const ids = (kind: string) =>
    sheets.flatMap((ref) => (ref.startsWith(`${kind}:`) ? [ref.slice(kind.length + 1)] : []));
  const layouts = new Set(ids('layout'));
  const revisions = new Set(ids('revision'));
  const project = { model: Layout, as: 'layout', attributes: [], required: true, where: { projectId } };
  const found =
    (await Layout.count({ where: { id: [...layouts], projectId }, transaction })) +
    (await Revision.count({ where: { id: [...revisions] }, include: [project], transaction }));
  if (found !== sheets.length) {
    throw invalid('sheets', 'One of these sheets is not in the project, or stands twice. Choose the sheets again.');
  }
}

/** Keeps a comparison under a name. Throws 422 for a sheet of another project. */
export async function keepComparison(
  actor: MemberActor,
  projectId: string,
  { name, sheets, view }: ComparisonRequest,
  outer?: Transaction,
): Promise<ComparisonAnswer> {
  return inTransaction(async (transaction) => {
    const project = await findProject(actor, projectId, transaction);
    await demandSheets(project.id, sheets, transaction);
    const values = { projectId: project.id, name, sheets, view, createdBy: actor.userId };
    const row = await Comparison.create(values, { transaction });
    return { ...present(row), createdBy: actor.name };
  }, outer);
}

/** Takes a kept comparison away; the sheets stay. Throws not_found. */
export async function dropComparison(actor: MemberActor, comparisonId: string, outer?: Transaction): Promise<void> {
  await inTransaction(async (transaction) => {
    const row = await Comparison.findOne({
      where: { id: comparisonId },
      include: [{ model: Project, as: 'project', required: true, where: projectScope(actor) }],
      transaction,
    });
    if (!row) throw notFound('comparison');
    await row.destroy({ transaction });
  }, outer);
}
