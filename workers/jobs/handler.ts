import type { Logger } from 'pino';
import type { MapComputer } from '@/lib/server/maps/computer';
import type { StudyComputer } from '@/lib/server/studies/computer';

/** What a worker process lends to its jobs. */
export interface JobContext {
  readonly maps: MapComputer;
  readonly studies: StudyComputer;
  readonly log: Logger;
}

export interface JobHandler<Data> {
  /** Does the job; must bear to be run twice, even at the same time. An error asks for another try. */
  readonly handle: (data: Data, context: JobContext) => Promise<void>;
  /** Tells whoever waits that no further try will come. `lastError` is a sentence. */
  readonly giveUp: (data: Data, lastError: string, context: JobContext) => Promise<void>;
}
