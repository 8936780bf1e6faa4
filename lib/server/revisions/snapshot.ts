import { createHash } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { snapshotSchema, type Snapshot } from '@/lib/contracts/revisions';
import { canonicalJson } from '@/lib/kinematics/canonical-json';
import type { Item } from '@/lib/layout/items';
import { questionOfRobot } from '@/lib/layout/map-question';
import type { MapSettings } from '@/lib/layout/map-settings';
import { FloorPlan, type Layout, type Project } from '@/models';
import { armsByIds } from '../arms/data';
import { presentFloorPlan } from '../floor-plans/present';
import { storedItemsOf } from '../layouts/data';
import { armIdsOf } from '../layouts/read-layouts';
import { finishedMapFor } from '../maps';
import type { MemberActor } from '../policy';

/** The stored map of each robot; where it is not finished, none. */
async function mapsOf(
  actor: MemberActor,
  items: readonly Item[],
  settings: MapSettings,
  transaction: Transaction,
): Promise<Snapshot['maps']> {
  const maps: Snapshot['maps'] = [];
  for (const item of items) {
    if (item.kind !== 'robot') continue;
    const map = await finishedMapFor(actor, questionOfRobot(item, settings), transaction);
    if (map) maps.push({ robotId: item.id, mapId: map.id, key: map.key });
  }
  return maps;
}

/** All that a reader of the revision will ever see, as it is at this moment; the layout must be held by the transaction. */
export async function takeSnapshot(
  actor: MemberActor,
  layout: Layout & { project: Project },
  transaction: Transaction,
): Promise<Snapshot> {
  const items = (await storedItemsOf(layout.id, transaction)).map(({ item }) => item);
  const floorPlan = layout.floorPlanId ? await FloorPlan.findByPk(layout.floorPlanId, { transaction }) : null;
  // Parsed, so that only members of the contract are frozen and hashed.
  return snapshotSchema.parse({
    format: 1,
    projectName: layout.project.name,
    customerName: layout.project.customerName,
    letter: layout.letter,
    name: layout.name,
    layoutVersion: layout.version,
    items,
    arms: await armsByIds(actor.organisationId, armIdsOf(items), transaction),
    floorPlan: floorPlan && presentFloorPlan(floorPlan),
    mapSettings: layout.mapSettings,
    maps: await mapsOf(actor, items, layout.mapSettings, transaction),
  });
}

/** SHA-256 of the canonical JSON, hexadecimal: the same for the same content, whatever the order of its members. */
export function snapshotHash(snapshot: Snapshot): string {
  return createHash('sha256').update(canonicalJson(snapshot)).digest('hex');
}
