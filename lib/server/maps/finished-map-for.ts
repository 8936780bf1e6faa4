import type { Transaction } from 'sequelize';
import type { MapQuestion } from '@/lib/contracts/maps';
import { DexterityMap } from '@/models';
import { demandRole, type Actor } from '../policy';
import { mapInputOf, mapKey } from './question';

/** The finished map of a question, where there is one; asks for nothing. */
export async function finishedMapFor(
  actor: Actor,
  question: MapQuestion,
  transaction?: Transaction,
): Promise<{ id: string; key: string } | null> {
  demandRole(actor, 'planner');
  const key = mapKey(await mapInputOf(actor, question, transaction));
  const where = { organisationId: actor.organisationId, key, state: 'done' };
  const map = await DexterityMap.findOne({ attributes: ['id', 'key'], where, transaction });
  return map && { id: map.id, key: map.key };
}
