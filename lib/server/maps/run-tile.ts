import type { Transaction } from 'sequelize';
import { KERNEL_VERSION } from '@/lib/kinematics/version';
import { DexterityMap, MapTile } from '@/models';
import { inTransaction } from '../database';
import type { MapTileJob } from '../jobs';
import type { MapComputer, TileTask } from './computer';
import { failMap } from './fail-map';
import { mapInputSchema, type MapInput } from './question';
import { rowsOfTile } from './tiling';

/**
 * Computes and stores one tile; the tile that completes the map also sums it up. Safe to repeat: a tile that is there
 * already is not computed again.
 * @throws Error where another try may help: the database or a thread is gone, or the worker is of another version.
 */
export async function runMapTile(job: MapTileJob, computer: MapComputer): Promise<void> {
  const map = await DexterityMap.findByPk(job.mapId);
  if (!map || !isCurrent(map, job)) return;
  const input = mapInputSchema.safeParse(map.input);
  if (!input.success) return failMap(job, 'The stored question cannot be read. Ask for the map again.');
  if (input.data.kernelVersion !== KERNEL_VERSION) {
    throw new Error(`The map needs computation ${input.data.kernelVersion}, and this worker has ${KERNEL_VERSION}.`);
  }
  await markRunning(job);
  const rows = rowsOfTile(input.data.request.grid, map.tileCount, job.index);
  const bytes = await tileBytes(job, { arm: input.data.arm, request: input.data.request, ...rows }, computer);
  if (bytes) await storeTile(job, input.data, bytes, computer);
}

function isCurrent(map: DexterityMap, { attempt }: MapTileJob): boolean {
  return map.attempt === attempt && (map.state === 'queued' || map.state === 'running');
}

async function markRunning({ mapId, attempt }: MapTileJob): Promise<void> {
  const where = { id: mapId, attempt, state: 'queued' };
  await DexterityMap.update({ state: 'running', startedAt: new Date() }, { where });
}

/** Null where the kernel refuses the question: it would refuse it every time, so the map has failed. */
async function tileBytes(job: MapTileJob, task: TileTask, computer: MapComputer): Promise<Uint8Array | null> {
  const { mapId, attempt, index } = job;
  const stored = await MapTile.findOne({ where: { mapId, attempt, index } });
  if (stored) return stored.bytes;
  const result = await computer.computeTile(task);
  if ('bytes' in result) return result.bytes;
  await failMap(job, `The map cannot be computed: ${result.fault}`);
  return null;
}

/** Fenced: a worker that comes late, after a cancel or a new attempt, changes nothing. */
export async function storeTile(
  job: MapTileJob,
  input: MapInput,
  bytes: Uint8Array,
  computer: Pick<MapComputer, 'summarise'>,
): Promise<boolean> {
  const { mapId, attempt, index } = job;
  return inTransaction(async (transaction) => {
    const map = await DexterityMap.findByPk(mapId, { lock: transaction.LOCK.UPDATE, transaction });
    if (!map || !isCurrent(map, job)) return false;
    const tile = { mapId, attempt, index, bytes: Buffer.from(bytes) };
    await MapTile.bulkCreate([tile], { ignoreDuplicates: true, transaction });
    const tilesDone = await MapTile.count({ where: { mapId, attempt }, transaction });
    if (tilesDone < map.tileCount) await map.update({ tilesDone }, { transaction });
    else await finish(map, input, computer, transaction);
    return true;
  });
}

async function finish(
  map: DexterityMap,
  input: MapInput,
  computer: Pick<MapComputer, 'summarise'>,
  transaction: Transaction,
): Promise<void> {
  const tiles = await MapTile.findAll({
    where: { mapId: map.id, attempt: map.attempt },
    order: [['index', 'ASC']],
    transaction,
  });
  const summary = await computer.summarise({ grid: input.request.grid, tiles: tiles.map((tile) => tile.bytes) });
  await map.update({ state: 'done', tilesDone: map.tileCount, summary, finishedAt: new Date() }, { transaction });
}
