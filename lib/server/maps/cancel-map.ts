import type { Transaction } from 'sequelize';
import type { DexterityMap } from '@/models';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { conflict } from '../errors';
import { demandRole, type Actor } from '../policy';
import { lockMap } from './data';

/**
 * Stops a map. Tiles still queued find the map cancelled and do nothing; one being computed is refused when it comes.
 * @throws 404, 409 `map_finished` where the answer is already there.
 */
export async function cancelMap(actor: Actor, mapId: string, outer?: Transaction): Promise<DexterityMap> {
  demandRole(actor, 'planner');
  return inTransaction(async (transaction) => {
    const map = await lockMap(actor, mapId, transaction);
    if (map.state === 'done')
      throw conflict('map_finished', 'This map is finished already; there is nothing to cancel.');
    if (map.state === 'queued' || map.state === 'running') {
      await map.update({ state: 'cancelled', finishedAt: new Date() }, { transaction });
      await recordAudit(actor, { action: 'map.cancelled', subjectId: mapId }, transaction);
    }
    return map;
  }, outer);
}
