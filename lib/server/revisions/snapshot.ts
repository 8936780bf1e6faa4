import { createHash } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { snapshotSchema, type Snapshot } from '@/lib/contracts/revisions';
import { canonicalJson } from '@/lib/kinematics/canonical-json';
import type { Item, Robot } from '@/lib/layout/items';
import { questionOfRobot } from '@/lib/layout/map-question';
import type { MapSettings } from '@/lib/layout/map-settings';
import { FloorPlan, type Layout, type Project } from '@/models';
import { armsByIds } from '../arms/data';
import { AppError } from '../errors';
import { presentFloorPlan } from '../floor-plans/present';
import { storedItemsOf } from '../layouts/data';
import { armIdsOf } from '../layouts/read-layouts';
import { finishedMapFor } from '../maps/finished-map-for';
import type { MemberActor } from '../policy';

/** The stored map of one robot; null where it is not finished or cannot be asked for with these settings. */
async function mapOf(
  actor: MemberActor,
  robot: Robot,
  settings: MapSettings,
  transaction: Transaction,
): Promise<Snapshot['maps'][number] | null> {
  try {
    const map = await finishedMapFor(actor, questionOfRobot(robot, settings), transaction);
    return map && { robotId: robot.id, mapId: map.id, key: map.key };
  } catch (error) {
    if (error instanceof AppError && error.code === 'invalid') return null;
    throw error;
  }
}

async function mapsOf(
  actor: MemberActor,
  items: readonly Item[],
  settings: MapSettings,
  transaction: Transaction,
): Promise<Snapshot['maps']> {
  const maps: Snapshot['maps'] = [];
  for (const item of items) {
    const map = item.kind === 'robot' ? await mapOf(actor, item, settings, transaction) : null;
    if (map) maps.push(map);
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
