import { literal, Op, QueryTypes, type Transaction, type WhereOptions } from 'sequelize';
import { Layout, LayoutItem, Project, Revision } from '@/models';
import type { StoredItem } from '@/lib/contracts/layouts';
import { itemSchema } from '@/lib/layout/items';
import { sequelize } from '../database';
import { notFound } from '../errors';
import { projectScope, seesDrafts, type Actor } from '../policy';

/** Viewers and guests learn of a variant only once it was issued. */
function layoutScope(actor: Actor): WhereOptions<Layout> {
  if (seesDrafts(actor)) return {};
  return literal('EXISTS (SELECT 1 FROM revisions WHERE revisions.layout_id = "Layout".id)');
}

/**
 * The layout with its project if the actor may see it, for reading or (with `lock`) held until the transaction ends, so that
 * edits, issues and deletes of one layout come one after another. Throws not_found.
 */
export async function findLayout(
  actor: Actor,
  layoutId: string,
  transaction?: Transaction,
  { lock = false }: { lock?: boolean } = {},
): Promise<Layout & { project: Project }> {
  const layout = await Layout.findOne({
    where: { [Op.and]: [{ id: layoutId }, layoutScope(actor)] },
    include: [{ model: Project, as: 'project', where: projectScope(actor), required: true }],
    transaction,
    ...(lock && transaction ? { lock: { level: transaction.LOCK.UPDATE, of: Layout } } : {}),
  });
  if (!layout?.project) throw notFound('variant');
  return layout as Layout & { project: Project };
}

/** The variants of a project that the caller has already been let at, in the order of their letters. */
export async function layoutsOf(actor: Actor, project: Project, transaction?: Transaction): Promise<Layout[]> {
  return Layout.findAll({
    where: { [Op.and]: [{ projectId: project.id }, layoutScope(actor)] },
    // A before Z before AA.
    order: [
      [literal('length(letter)'), 'ASC'],
      ['letter', 'ASC'],
    ],
    transaction,
  });
}

/** As drawn and listed: items without a place first, then by place, then as they came. */
export function inSheetOrder<T extends { item: { order?: number } }>(entries: readonly T[]): T[] {
  const place = ({ item }: T): number => item.order ?? -Infinity;
  return [...entries].sort((a, b) => (place(a) === place(b) ? 0 : place(a) - place(b)));
}

export async function storedItemsOf(layoutId: string, transaction?: Transaction): Promise<StoredItem[]> {
  const rows = await LayoutItem.findAll({
    where: { layoutId, removedAt: null },
    order: [
      ['createdAt', 'ASC'],
      ['id', 'ASC'],
    ],
    transaction,
  });
  // Parsed, so that items stored before a field was known have it too.
  return inSheetOrder(rows.map(({ version, data }) => ({ version, item: itemSchema.parse(data) })));
}

/** The newest revision of each layout; layouts never issued are left out. */
export async function latestRevisions(
  layoutIds: readonly string[],
  transaction?: Transaction,
): Promise<Map<string, Revision>> {
  if (layoutIds.length === 0) return new Map();
  const rows = await Revision.findAll({
    where: {
      [Op.and]: [
        { layoutId: [...layoutIds] },
        literal(`"Revision".number = (
          SELECT max(newest.number) FROM revisions newest WHERE newest.layout_id = "Revision".layout_id)`),
      ],
    },
    transaction,
  });
  return new Map(rows.map((revision) => [revision.layoutId, revision]));
}

export async function itemCounts(
  layoutIds: readonly string[],
  transaction?: Transaction,
): Promise<Map<string, number>> {
  if (layoutIds.length === 0) return new Map();
  const rows = await sequelize.query<{ layoutId: string; count: number }>(
    `SELECT layout_id AS "layoutId", count(*)::int AS count FROM items
     WHERE layout_id IN (:layoutIds) AND removed_at IS NULL GROUP BY layout_id`,
    { replacements: { layoutIds: [...layoutIds] }, type: QueryTypes.SELECT, transaction },
  );
  return new Map(rows.map(({ layoutId, count }) => [layoutId, count]));
}
