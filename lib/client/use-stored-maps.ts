'use client';

import useSWR from 'swr';
import { dexterityMapSchema, type DexterityMap } from '@/lib/contracts/maps';
import type { Snapshot } from '@/lib/contracts/revisions';
import type { MapTile } from '@/lib/kinematics/types';
import { fetcher, type ProblemError } from './fetcher';
import { fetchTilesFrom } from './map-tiles';

export interface StoredMap {
  readonly grid: DexterityMap['grid'];
  readonly tile: MapTile;
}

/**
 * The maps that a revision kept, by robot id. They never change, so they are fetched once.
 * @param base where maps are read: `/api/maps`, or `/api/share/[token]/maps` behind a link.
 */
export function useStoredMaps(base: string, maps: Snapshot['maps'] | null) {
  const key =
    maps && maps.length > 0 ? ([base, ...maps.map(({ robotId, mapId }) => `${robotId} ${mapId}`)] as const) : null;
  return useSWR<ReadonlyMap<string, StoredMap>, ProblemError>(
    key,
    async () => {
      const fetched = await Promise.all(
        (maps ?? []).map(async ({ robotId, mapId }) => [robotId, await fetchStored(`${base}/${mapId}`)] as const),
      );
      return new Map(fetched);
    },
    { revalidateOnFocus: false, revalidateIfStale: false, revalidateOnReconnect: false },
  );
}

async function fetchStored(url: string): Promise<StoredMap> {
  const { grid } = await fetcher(url, dexterityMapSchema);
  return { grid, tile: await fetchTilesFrom(`${url}/tiles`, grid) };
}
