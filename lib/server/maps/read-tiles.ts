import { MapTile } from '@/models';
import { conflict } from '../errors';
import type { Actor } from '../policy';
import { findMap } from './data';

/** A finished map's tiles, one behind another, each as a 4-byte little-endian length and its bytes. */
export interface StoredTiles {
  /** Names the content: it never changes once the map is done. */
  readonly key: string;
  readonly stream: () => ReadableStream<Uint8Array>;
}

/**
 * @param actor a member, or a share link whose revision names the map.
 * @throws 404, 409 `map_not_ready` before the map is done.
 */
export async function readMapTiles(actor: Actor, mapId: string): Promise<StoredTiles> {
  const map = await findMap(actor, mapId);
  if (map.state !== 'done') {
    throw conflict('map_not_ready', 'This map is not finished. Wait for it, or ask for it again if it has failed.');
  }
  const { id, attempt, tileCount, key } = map;
  return { key, stream: () => streamTiles(id, attempt, tileCount) };
}

/** One tile at a time: a map of a million spots need not lie in memory for every reader. */
function streamTiles(mapId: string, attempt: number, tileCount: number): ReadableStream<Uint8Array> {
  let index = 0;
  return new ReadableStream({
    async pull(controller) {
      if (index >= tileCount) return controller.close();
      const { bytes } = await MapTile.findOne({ where: { mapId, attempt, index }, rejectOnEmpty: true });
      const length = new Uint8Array(4);
      new DataView(length.buffer).setUint32(0, bytes.byteLength, true);
      controller.enqueue(length);
      controller.enqueue(bytes);
      index += 1;
    },
  });
}
