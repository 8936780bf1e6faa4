import type { DexterityMap as MapAnswer } from '@/lib/contracts/maps';
import type { DexterityMap } from '@/models';

export function presentMap(map: DexterityMap): MapAnswer {
  return {
    id: map.id,
    key: map.key,
    state: map.state,
    progress: { done: map.tilesDone, total: map.tileCount },
    failure: map.failure ?? null,
    grid: map.grid,
    summary: map.summary ?? null,
    askedAt: map.createdAt.toISOString(),
    finishedAt: map.finishedAt?.toISOString() ?? null,
  };
}
