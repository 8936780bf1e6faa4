import { mailJob, mapTileJob, reportJob, studySliceJob, type JobDefinition } from '@/lib/server/jobs';
import type { JobHandler } from './handler';

interface Registration {
  readonly definition: JobDefinition;
  /** How many of these run at a time in one worker process; 'threads': as many as there are threads for maps. */
  readonly atOnce: number | 'threads';
  /** How long a new job may lie unseen by an idle worker. */
  readonly pollSeconds: number;
  /** Loaded with the first job of its kind. */
  readonly load: () => Promise<JobHandler<never>>;
}

export const REGISTRATIONS: readonly Registration[] = [
  {
    definition: mapTileJob,
    atOnce: 'threads',
    pollSeconds: 0.5,
    load: async () => (await import('./map-tile')).handler,
  },
  {
    definition: studySliceJob,
    atOnce: 'threads',
    pollSeconds: 0.5,
    load: async () => (await import('./study-slice')).handler,
  },
  { definition: reportJob, atOnce: 1, pollSeconds: 1, load: async () => (await import('./report')).handler },
  { definition: mailJob, atOnce: 2, pollSeconds: 1, load: async () => (await import('./mail')).handler },
];
