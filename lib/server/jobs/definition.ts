import type { z } from 'zod';

/**
 * What the sender and the worker must agree on about one kind of job. The handler lives in workers/jobs and is loaded by the
 * worker alone, so that a request which enqueues a job does not carry the code that does it.
 */
export interface JobDefinition<S extends z.ZodType = z.ZodType> {
  readonly name: string;
  /** Checked when the job is sent and again when it is taken: a worker may be newer or older than the sender. */
  readonly schema: S;
  readonly options: {
    /** After this a job whose worker has vanished is given to another one; longer than any honest run. */
    readonly expireInSeconds: number;
    /** At least 10: an attempt is also spent when a worker is stopped or killed, and that is nobody's mistake. */
    readonly retryLimit: number;
    readonly retryDelay: number;
    /** Doubles the delay with every attempt. */
    readonly retryBackoff: boolean;
  };
}

/** Where jobs go that failed at every attempt, with their data and the last error. */
export function deadLetterOf(definition: JobDefinition): string {
  return `${definition.name}-dead`;
}
