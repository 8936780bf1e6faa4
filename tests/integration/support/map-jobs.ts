import { QueryTypes } from 'sequelize';
import { sequelize } from '@/lib/server/database';
import { mapTileJob, type MapTileJob } from '@/lib/server/jobs';
import { computeTile, summarise } from '@/lib/server/maps/compute';
import type { MapComputer } from '@/lib/server/maps/computer';
import { runMapTile } from '@/lib/server/maps/run-tile';
import { QUEUE_SCHEMA } from '@/lib/server/queue';
import type { MapQuestion } from '@/lib/contracts/maps';
import { MapTile } from '@/models';

/** Fine enough for several tiles. */
export const SEVERAL_TILES = {
  tiltDeg: 0,
  towards: 'outward',
  rollDeg: 'free',
  wrist: 'held',
  branch: 'best',
  coneDeg: 0,
  stepMm: 25,
} as const;

/** A coarse map of the test arm: one tile, done in a moment. */
export function question(armId: string, change: Partial<MapQuestion> = {}): MapQuestion {
  return {
    armId,
    tool: { xMm: 0, yMm: 0, zMm: 100, rollDeg: 0, pitchDeg: 0, yawDeg: 0 },
    toolHeightMm: 300,
    settings: { ...SEVERAL_TILES, stepMm: 50 },
    headingDeg: 0,
    ...change,
  };
}

/** Computes in this very process. */
export const inProcess: MapComputer = {
  computeTile: async (task) => computeTile(task),
  summarise: async (task) => summarise(task),
};

/** The tile jobs of a map that the queue holds, whatever became of them, oldest attempt first. */
export async function tileJobs(mapId: string): Promise<MapTileJob[]> {
  const rows = await sequelize.query<{ data: MapTileJob }>(
    `SELECT data FROM ${QUEUE_SCHEMA}.job WHERE name = $1 AND data ->> 'mapId' = $2
     ORDER BY (data ->> 'attempt')::int, (data ->> 'index')::int`,
    { bind: [mapTileJob.name, mapId], type: QueryTypes.SELECT },
  );
  return rows.map((row) => row.data);
}

/** Does every queued tile once, as a worker would. */
export async function runTiles(mapId: string, computer: MapComputer = inProcess): Promise<void> {
  for (const job of await tileJobs(mapId)) await runMapTile(job, computer);
}

/** Every stored tile as text, in order: which attempt made it and what it holds. */
export async function tilesOf(mapId: string): Promise<string[]> {
  const tiles = await MapTile.findAll({ where: { mapId }, order: [['index', 'ASC']] });
  return tiles.map(({ index, attempt, bytes }) => `${index} of attempt ${attempt}: ${bytes.toString('base64')}`);
}
