import { literal, Op, type Transaction } from 'sequelize';
import { Project } from '@/models';
import type { ProjectListQuery } from '@/lib/contracts/projects';
import { notFound } from '../errors';
import { projectScope, seesDrafts, type Actor } from '../policy';

/** A project with the figures of its row in the table. */
export type CountedProject = Project & { layoutCount: number; openRemarkCount: number; changedAt: Date };

/**
 * What may be seen of `layouts` by the actor: all, or (viewers and guests) only variants that were issued; a condition in SQL.
 */
const layoutIsSeen = (actor: Actor): string =>
  seesDrafts(actor) ? 'true' : 'EXISTS (SELECT 1 FROM revisions WHERE revisions.layout_id = layouts.id)';

const figures = (actor: Actor): [ReturnType<typeof literal>, string][] => [
  [
    literal(`(SELECT count(*)::int FROM layouts WHERE layouts.project_id = "Project".id AND ${layoutIsSeen(actor)})`),
    'layoutCount',
  ],
  [
    literal(`(SELECT count(*)::int FROM remarks JOIN layouts ON layouts.id = remarks.layout_id
      WHERE layouts.project_id = "Project".id AND remarks.resolved_at IS NULL)`),
    'openRemarkCount',
  ],
  [
    literal(`(SELECT greatest("Project".updated_at, max(layouts.updated_at)) FROM layouts
      WHERE layouts.project_id = "Project".id AND ${layoutIsSeen(actor)})`),
    'changedAt',
  ],
];

/** The project if the actor may see it, for reading or (with `lock`) held until the transaction ends. Throws not_found. */
export async function findProject(
  actor: Actor,
  projectId: string,
  transaction?: Transaction,
  { lock = false }: { lock?: boolean } = {},
): Promise<Project> {
  const project = await Project.findOne({
    where: { [Op.and]: [{ id: projectId }, projectScope(actor)] },
    transaction,
    ...(lock && transaction ? { lock: transaction.LOCK.UPDATE } : {}),
  });
  if (!project) throw notFound('project');
  return project;
}

export async function findCountedProject(
  actor: Actor,
  projectId: string,
  transaction?: Transaction,
): Promise<CountedProject> {
  const project = await Project.findOne({
    where: { [Op.and]: [{ id: projectId }, projectScope(actor)] },
    attributes: { include: figures(actor) },
    transaction,
  });
  if (!project) throw notFound('project');
  return project as CountedProject;
}

/** What a user types is text to look for, not a pattern. */
const containing = (search: string) => ({ [Op.iLike]: `%${search.replace(/[\\%_]/g, '\\$&')}%` });

/** Projects of the actor, the last changed first; `search` looks into name, customer and site. */
export async function listProjects(
  actor: Actor,
  { archived, search }: ProjectListQuery,
  transaction?: Transaction,
): Promise<CountedProject[]> {
  const matching = containing(search);
  const rows = await Project.findAll({
    where: {
      [Op.and]: [
        projectScope(actor),
        { archivedAt: archived === 'true' ? { [Op.not]: null } : null },
        search ? { [Op.or]: [{ name: matching }, { customerName: matching }, { siteName: matching }] } : {},
      ],
    },
    attributes: { include: figures(actor) },
    order: [
      [literal('"changedAt"'), 'DESC'],
      ['id', 'ASC'],
    ],
    transaction,
  });
  return rows as CountedProject[];
}
