import type { Snapshot } from '@/lib/contracts/revisions';
import { decodeMapTile } from '@/lib/kinematics/maps/tile-codec';
import type { PlacedMap } from '@/lib/layout/floor-map';
import { joinTiles } from '@/lib/layout/map-tiles';
import { DexterityMap, MapTile } from '@/models';

/**
 * The finished maps of a frozen sheet where their robots stand, in the order of the snapshot. For callers that have shown their right
 * to the sheet.
 */
export async function placedMapsOf(snapshot: Snapshot, organisationId: string): Promise<PlacedMap[]> {
  const placed: PlacedMap[] = [];
  for (const { robotId, mapId } of snapshot.maps) {
    const robot = snapshot.items.find(({ id }) => id === robotId);
    const map = await DexterityMap.findOne({ where: { id: mapId, organisationId, state: 'done' } });
    if (!robot || !map) continue;
    const rows = await MapTile.findAll({ where: { mapId, attempt: map.attempt }, order: [['index', 'ASC']] });
    const { xMm, yMm, angleDeg } = robot;
    const tile = joinTiles(rows.map(({ bytes }) => decodeMapTile(bytes)));
    placed.push({ robotId, placement: { xMm, yMm, angleDeg }, grid: map.grid, tile });
  }
  return placed;
}
