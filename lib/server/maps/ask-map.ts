import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { MapQuestion } from '@/lib/contracts/maps';
import { gridInMm } from '@/lib/layout/map-question';
import { DexterityMap } from '@/models';
import { inTransaction } from '../database';
import { tooManyRequests } from '../errors';
import { demandRole, type Actor, type MemberActor } from '../policy';
import { demandAffordable, mapInputOf, mapKey, type MapInput } from './question';
import { startAttempt } from './start-attempt';
import { tileCountOf } from './tiling';

/** Maps that one organisation may have under way: the workers belong to all of them. */
const UNDER_WAY_LIMIT = 50;

/**
 * The stored map of a question, at once where it was ever answered. Otherwise its tiles are queued, once however many ask
 * at the same moment; a map that failed or was cancelled is started again.
 * @throws 404 for an arm of somebody else, 422 for a map of too many spots, 429 with too many maps under way.
 */
export async function askMap(actor: Actor, question: MapQuestion, outer?: Transaction): Promise<DexterityMap> {
  demandRole(actor, 'planner');
  const input = await mapInputOf(actor, question, outer);
  demandAffordable(input);
  const where = { organisationId: actor.organisationId, key: mapKey(input) };
  const stored = await DexterityMap.findOne({ where, transaction: outer });
  if (stored && !isOver(stored)) return stored;

  return inTransaction(async (transaction) => {
    if (!stored) await insertIfNew(actor, input, where.key, transaction);
    // Whoever comes second waits here until the first has committed, and then finds the tiles queued.
    const map = await DexterityMap.findOne({ where, lock: transaction.LOCK.UPDATE, transaction, rejectOnEmpty: true });
    if (map.attempt === 0 || isOver(map)) {
      await demandRoom(actor, transaction);
      await startAttempt(actor, map, input, transaction);
    }
    return map;
  }, outer);
}

/** Ended without an answer. */
function isOver({ state }: DexterityMap): boolean {
  return state === 'failed' || state === 'cancelled';
}

async function insertIfNew(actor: MemberActor, input: MapInput, key: string, transaction: Transaction): Promise<void> {
  const row = {
    id: randomUUID(),
    organisationId: actor.organisationId,
    key,
    input,
    grid: gridInMm(input.request.grid),
    tileCount: tileCountOf(input),
    askedBy: actor.userId,
  };
  await DexterityMap.bulkCreate([row], { ignoreDuplicates: true, transaction });
}

async function demandRoom(actor: MemberActor, transaction: Transaction): Promise<void> {
  const where = { organisationId: actor.organisationId, state: ['queued', 'running'] };
  // The map about to start is one of them.
  if ((await DexterityMap.count({ where, transaction })) <= UNDER_WAY_LIMIT) return;
  throw tooManyRequests(
    `${UNDER_WAY_LIMIT} maps of your organisation are under way already. Wait for one to finish, or cancel one.`,
    10,
  );
}
