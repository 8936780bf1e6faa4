import { DexterityMap } from '@/models';
import type { MapTileJob } from '../jobs';

/** Ends an attempt with a reason in plain words; does nothing where it is no longer the current one. */
export async function failMap({ mapId, attempt }: MapTileJob, reason: string): Promise<void> {
  await DexterityMap.update(
    { state: 'failed', failure: reason, finishedAt: new Date() },
    { where: { id: mapId, attempt, state: ['queued', 'running'] } },
  );
}
