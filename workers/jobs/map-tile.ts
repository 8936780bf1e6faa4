import { failMap } from '@/lib/server/maps/fail-map';
import { runMapTile } from '@/lib/server/maps/run-tile';
import type { MapTileJob } from '@/lib/server/jobs';
import type { JobHandler } from './handler';

export const handler: JobHandler<MapTileJob> = {
  handle: (job, { maps }) => runMapTile(job, maps),
  giveUp: (job, lastError) =>
    failMap(
      job,
      `A part of the map could not be computed in several tries. The last one ended with: ${lastError} ` +
        'Try again; if it fails again, tell your admin.',
    ),
};
