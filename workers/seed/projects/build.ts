import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { FloorPlan } from '@/lib/contracts/floor-plans';
import type { LayoutSummary } from '@/lib/contracts/layouts';
import type { Item } from '@/lib/layout/items';
import { mapSettingsSchema, type MapSettings } from '@/lib/layout/map-settings';
import { addFloorPlan } from '@/lib/server/floor-plans/add-floor-plan';
import { changeFloorPlan } from '@/lib/server/floor-plans/change-floor-plan';
import { changeLayout } from '@/lib/server/layouts/change-layout';
import { createLayout } from '@/lib/server/layouts/create-layout';
import { storedItemsOf } from '@/lib/server/layouts/data';
import { editLayout } from '@/lib/server/layouts/edit-layout';
import type { MemberActor } from '@/lib/server/policy';
import { Arm } from '@/models';
import { drawHall, type Hall } from './draw-hall';
import { inOrder } from './items';

/** The newest version of a built-in arm. Throws where the library lacks it. */
export async function armNamed(actor: MemberActor, name: string, transaction: Transaction): Promise<string> {
  const where = { organisationId: actor.organisationId, name };
  const arm = await Arm.findOne({ where, order: [['version', 'DESC']], rejectOnEmpty: true, transaction });
  return arm.id;
}

/** Takes the drawn hall in like any upload and sets it to scale like any plan. */
export async function addHall(
  actor: MemberActor,
  projectId: string,
  hall: Hall,
  transaction: Transaction,
): Promise<FloorPlan> {
  const { bytes, calibration } = await drawHall(hall);
  const { id } = await addFloorPlan(actor, projectId, { bytes, name: hall.title }, transaction);
  return changeFloorPlan(actor, id, { calibration }, transaction);
}

interface Variant {
  name: string;
  floorPlanId: string;
  items: readonly Item[];
  settings?: Partial<MapSettings>;
}

export async function addVariant(
  actor: MemberActor,
  projectId: string,
  { name, floorPlanId, items, settings }: Variant,
  transaction: Transaction,
): Promise<LayoutSummary> {
  const layout = await createLayout(actor, projectId, { name, copyOf: null }, transaction);
  const mapSettings = mapSettingsSchema.parse({ ...settings });
  await changeLayout(actor, layout.id, { floorPlanId, mapSettings }, transaction);
  const operations = inOrder(items).map((item) => ({ type: 'put' as const, baseVersion: 0, item }));
  await editLayout(actor, layout.id, { id: randomUUID(), operations }, transaction);
  return layout;
}

/** Starts a variant from another one and changes it: `edit` gets the copied items and answers those that differ or are new. */
export async function addVariantFrom(
  actor: MemberActor,
  model: LayoutSummary,
  name: string,
  edit: (items: Item[]) => Item[],
  transaction: Transaction,
): Promise<LayoutSummary> {
  const layout = await createLayout(actor, model.projectId, { name, copyOf: model.id }, transaction);
  const stored = await storedItemsOf(layout.id, transaction);
  const versions = new Map(stored.map(({ version, item }) => [item.id, version]));
  const operations = edit(stored.map(({ item }) => item)).map((item) => ({
    type: 'put' as const,
    baseVersion: versions.get(item.id) ?? 0,
    item,
  }));
  await editLayout(actor, layout.id, { id: randomUUID(), operations }, transaction);
  return layout;
}
