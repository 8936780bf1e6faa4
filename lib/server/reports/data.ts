import { Op, type Includeable, type Transaction, type WhereOptions } from 'sequelize';
import type { ExportSubject } from '@/lib/contracts/exports';
import { Layout, Project, Report, User } from '@/models';
import { notFound } from '../errors';
import { projectScope, seesDrafts, type Actor } from '../policy';

const around = (actor: Actor): Includeable[] => [
  {
    model: Layout,
    as: 'layout',
    required: true,
    include: [{ model: Project, as: 'project', required: true, where: projectScope(actor) }],
  },
  { model: User, as: 'asker' },
];

/** Viewers see the reports of what was issued, a guest those of the one revision shared. */
function reportScope(actor: Actor): WhereOptions<Report> {
  const own = { organisationId: actor.organisationId };
  if (actor.kind === 'share') return { ...own, revisionId: actor.revisionId };
  return seesDrafts(actor) ? own : { ...own, revisionId: { [Op.not]: null } };
}

/** Throws not_found for a report that is not theirs. The frozen sheet is left out unless it is asked for. */
export async function findReport(
  actor: Actor,
  reportId: string,
  transaction?: Transaction,
  { lock = false }: { lock?: boolean } = {},
): Promise<Report> {
  const report = await Report.findOne({
    where: { [Op.and]: [{ id: reportId }, reportScope(actor)] },
    attributes: { exclude: ['input'] },
    include: around(actor),
    transaction,
    ...(lock && transaction ? { lock: { level: transaction.LOCK.UPDATE, of: Report } } : {}),
  });
  if (!report) throw notFound('report');
  return report;
}

/** The reports of a draft or of a revision that the caller has already been let at, newest first. */
export async function reportsOf(actor: Actor, subject: ExportSubject, subjectId: string): Promise<Report[]> {
  const which = subject === 'revisions' ? { revisionId: subjectId } : { layoutId: subjectId, revisionId: null };
  return Report.findAll({
    where: { [Op.and]: [which, reportScope(actor)] },
    attributes: { exclude: ['input'] },
    include: around(actor),
    order: [
      ['createdAt', 'DESC'],
      ['id', 'ASC'],
    ],
    limit: 100,
  });
}
