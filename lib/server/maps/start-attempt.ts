import type { Transaction } from 'sequelize';
import { MapTile, type DexterityMap } from '@/models';
import { recordAudit } from '../audit';
import { mapTileJob } from '../jobs';
import { enqueueAll } from '../queue';
import type { MemberActor } from '../policy';
import type { MapInput } from './question';
import { secondsPerTile } from './tiling';

/** How much longer than on an idle core a tile may take before its worker counts as lost. */
const SLACK = 10;

/**
 * Queues every tile of a locked map under the next attempt number. What an earlier attempt left is dropped, and what it may
 * still be computing is refused when it comes.
 */
export async function startAttempt(
  actor: MemberActor,
  map: DexterityMap,
  input: MapInput,
  transaction: Transaction,
): Promise<void> {
  await MapTile.destroy({ where: { mapId: map.id }, transaction });
  const attempt = map.attempt + 1;
  await map.update(
    { state: 'queued', attempt, tilesDone: 0, failure: null, summary: null, startedAt: null, finishedAt: null },
    { transaction },
  );
  const jobs = Array.from({ length: map.tileCount }, (_, index) => ({ mapId: map.id, attempt, index }));
  await enqueueAll(mapTileJob, jobs, {
    transaction,
    // A quick map does not wait behind the many tiles of a fine one.
    priority: -Math.floor(Math.log2(map.tileCount)),
    expireInSeconds: Math.max(mapTileJob.options.expireInSeconds, Math.ceil(SLACK * secondsPerTile(input))),
  });
  const details = { attempt, stepMm: map.grid.stepMm, spots: map.grid.columns * map.grid.rows };
  await recordAudit(actor, { action: 'map.asked', subjectId: map.id, details }, transaction);
}
