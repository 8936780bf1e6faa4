import { Op, type Transaction } from 'sequelize';
import type { Layout as LayoutAnswer, LayoutChanges, LayoutSummary } from '@/lib/contracts/layouts';
import type { Item } from '@/lib/layout/items';
import { FloorPlan, LayoutItem, type Layout } from '@/models';
import { armsByIds } from '../arms/data';
import { presentFloorPlan } from '../floor-plans/present';
import type { Actor, MemberActor } from '../policy';
import { findProject } from '../projects/data';
import { findLayout, inSheetOrder, itemCounts, latestRevisions, layoutsOf, storedItemsOf } from './data';
import { presentSummary } from './present';

export const armIdsOf = (items: readonly Item[]): string[] => [
  ...new Set(items.flatMap((item) => (item.kind === 'robot' ? [item.armId] : []))),
];

async function summaries(actor: Actor, layouts: Layout[], transaction?: Transaction): Promise<LayoutSummary[]> {
  const ids = layouts.map(({ id }) => id);
  const latest = await latestRevisions(ids, transaction);
  const counts = await itemCounts(ids, transaction);
  return layouts.map((layout) =>
    presentSummary(actor, layout, { latest: latest.get(layout.id), itemCount: counts.get(layout.id) ?? 0 }),
  );
}

export async function listLayouts(
  actor: Actor,
  projectId: string,
  transaction?: Transaction,
): Promise<LayoutSummary[]> {
  const project = await findProject(actor, projectId, transaction);
  return summaries(actor, await layoutsOf(actor, project, transaction), transaction);
}

export async function summaryOf(actor: Actor, layout: Layout, transaction?: Transaction): Promise<LayoutSummary> {
  const [summary] = await summaries(actor, [layout], transaction);
  return summary;
}

/** The draft with all that the sheet needs to draw it. */
export async function readLayout(
  actor: MemberActor,
  layoutId: string,
  transaction?: Transaction,
): Promise<LayoutAnswer> {
  const layout = await findLayout(actor, layoutId, transaction);
  const items = await storedItemsOf(layout.id, transaction);
  const floorPlan = layout.floorPlanId ? await FloorPlan.findByPk(layout.floorPlanId, { transaction }) : null;
  return {
    ...(await summaryOf(actor, layout, transaction)),
    projectName: layout.project.name,
    mapSettings: layout.mapSettings,
    items,
    floorPlan: floorPlan && presentFloorPlan(floorPlan),
    arms: await armsByIds(actor.organisationId, armIdsOf(items.map(({ item }) => item)), transaction),
  };
}

/** What changed after layout version `since`: items as they are now, and the ids of those removed. */
export async function readChanges(
  actor: MemberActor,
  layoutId: string,
  since: number,
  transaction?: Transaction,
): Promise<LayoutChanges> {
  const layout = await findLayout(actor, layoutId, transaction);
  const rows = await LayoutItem.findAll({
    where: { layoutId: layout.id, layoutVersion: { [Op.gt]: since } },
    order: ['createdAt', 'id'],
    transaction,
  });
  return {
    layoutVersion: layout.version,
    items: inSheetOrder(
      rows.filter(({ removedAt }) => !removedAt).map(({ version, data }) => ({ version, item: data })),
    ),
    removed: rows.filter(({ removedAt }) => removedAt).map(({ id }) => id),
    mapSettings: layout.mapSettings,
    floorPlanId: layout.floorPlanId,
  };
}
