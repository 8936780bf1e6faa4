import type { Transaction } from 'sequelize';
import { KERNEL_VERSION } from '@/lib/kinematics/version';
import type { DexterityMap } from '@/models';
import { inTransaction } from '../database';
import { conflict } from '../errors';
import { demandRole, type Actor } from '../policy';
import { lockMap } from './data';
import { mapInputSchema } from './question';
import { startAttempt } from './start-attempt';

/**
 * Starts a failed or cancelled map again; one that is under way or done is answered as it is.
 * @throws 404, 409 `map_outdated` where the computation has changed since the map was asked.
 */
export async function retryMap(actor: Actor, mapId: string, outer?: Transaction): Promise<DexterityMap> {
  demandRole(actor, 'planner');
  return inTransaction(async (transaction) => {
    const map = await lockMap(actor, mapId, transaction);
    if (map.state !== 'failed' && map.state !== 'cancelled') return map;
    const input = mapInputSchema.safeParse(map.input);
    // Its key names the old computation, so the new one's answer must not be stored under it.
    if (!input.success || input.data.kernelVersion !== KERNEL_VERSION)
      throw conflict('map_outdated', 'The computation has changed since this map was asked. Ask for the map again.');
    await startAttempt(actor, map, input.data, transaction);
    return map;
  }, outer);
}
