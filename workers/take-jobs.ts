import type PgBoss from 'pg-boss';
import { deadLetterOf, type JobDefinition } from '@/lib/server/jobs';
import type { JobContext, JobHandler } from './jobs/handler';
import { REGISTRATIONS } from './jobs';
import { lastErrorOf } from './last-error';

/** Nobody waits long for the news that something has failed for good. */
const DEAD_LETTER_POLL_SECONDS = 2;

/** One kind of job as this worker takes it. */
interface Counter {
  readonly boss: PgBoss;
  readonly definition: JobDefinition;
  readonly context: JobContext;
  /** Loads the handler at the first job. */
  readonly load: () => Promise<JobHandler<never>>;
  /** Counts a job as in hand while it is done. */
  readonly holding: (work: () => Promise<void>) => Promise<void>;
}

/** Starts taking jobs of every kind; the answer tells whether any is in hand. */
export async function takeJobs(boss: PgBoss, context: JobContext, threads: number): Promise<() => boolean> {
  let inHand = 0;
  const holding: Counter['holding'] = async (work) => {
    inHand += 1;
    try {
      await work();
    } finally {
      inHand -= 1;
    }
  };
  for (const { definition, atOnce, pollSeconds, load } of REGISTRATIONS) {
    const counter = { boss, definition, context, load: once(load), holding };
    const loops = atOnce === 'threads' ? threads : atOnce;
    for (let loop = 0; loop < loops; loop += 1) await takeQueue(counter, pollSeconds);
    await takeDeadLetters(counter);
  }
  return () => inHand > 0;
}

/** Loads at the first call; a load that failed is tried again. */
function once(load: Counter['load']): Counter['load'] {
  let loaded: ReturnType<Counter['load']> | undefined;
  return () => {
    loaded ??= load().catch((error: unknown) => {
      loaded = undefined;
      throw error;
    });
    return loaded;
  };
}

async function takeQueue(counter: Counter, pollingIntervalSeconds: number): Promise<void> {
  const { boss, definition, context, load, holding } = counter;

  async function take(job: PgBoss.JobWithMetadata<object>): Promise<void> {
    const log = context.log.child({ job: job.id, queue: definition.name, retry: job.retryCount });
    const startedAt = performance.now();
    try {
      const { handle } = await load();
      await handle(definition.schema.parse(job.data) as never, { ...context, log });
      log.info({ ms: Math.round(performance.now() - startedAt) }, 'job done');
    } catch (error) {
      log.error({ err: error }, 'job failed');
      throw error;
    } finally {
      // Look for the next job at once; the pause is only for an empty queue.
      boss.notifyWorker(loop);
    }
  }

  const options = { batchSize: 1, pollingIntervalSeconds, includeMetadata: true } as const;
  const loop: string = await boss.work<object>(definition.name, options, ([job]) => holding(() => take(job)));
}

async function takeDeadLetters({ boss, definition, context, load, holding }: Counter): Promise<void> {
  const queue = deadLetterOf(definition);

  async function take(job: PgBoss.JobWithMetadata<object>): Promise<void> {
    const log = context.log.child({ job: job.id, queue });
    const lastError = lastErrorOf(job.output);
    log.error({ lastError }, 'job given up');
    const data = definition.schema.safeParse(job.data);
    if (!data.success) return;
    const { giveUp } = await load();
    await giveUp(data.data as never, lastError, { ...context, log });
  }

  const options = { batchSize: 1, pollingIntervalSeconds: DEAD_LETTER_POLL_SECONDS, includeMetadata: true } as const;
  await boss.work<object>(queue, options, ([job]) => holding(() => take(job)));
}
