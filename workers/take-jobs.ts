import type PgBoss from 'pg-boss';
import { deadLetterOf, type JobDefinition } from '@/lib/server/jobs';
import type { JobContext, JobHandler } from './jobs/handler';
import { REGISTRATIONS } from './jobs';

/** Nobody waits long for the news that something has failed for good. */
const DEAD_LETTER_POLL_SECONDS = 2;

/** Starts taking jobs of every kind. */
export async function takeJobs(boss: PgBoss, context: JobContext, threads: number): Promise<void> {
  for (const { definition, atOnce, pollSeconds, load } of REGISTRATIONS) {
    const handler = once(load);
    const loops = atOnce === 'threads' ? threads : atOnce;
    for (let loop = 0; loop < loops; loop += 1) await takeQueue(boss, definition, pollSeconds, handler, context);
    await takeDeadLetters(boss, definition, handler, context);
  }
}

type Loader = () => Promise<JobHandler<never>>;

/** Loads at the first call; a load that failed is tried again. */
function once(load: Loader): Loader {
  let loaded: ReturnType<Loader> | undefined;
  return () => {
    loaded ??= load().catch((error: unknown) => {
      loaded = undefined;
      throw error;
    });
    return loaded;
  };
}

async function takeQueue(
  boss: PgBoss,
  definition: JobDefinition,
  pollingIntervalSeconds: number,
  load: Loader,
  context: JobContext,
): Promise<void> {
  const loop: string = await boss.work<object>(
    definition.name,
    { batchSize: 1, pollingIntervalSeconds, includeMetadata: true },
    async ([job]) => {
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
    },
  );
}

async function takeDeadLetters(
  boss: PgBoss,
  definition: JobDefinition,
  load: Loader,
  context: JobContext,
): Promise<void> {
  const queue = deadLetterOf(definition);
  await boss.work<object>(
    queue,
    { batchSize: 1, pollingIntervalSeconds: DEAD_LETTER_POLL_SECONDS, includeMetadata: true },
    async ([job]) => {
      const log = context.log.child({ job: job.id, queue });
      const lastError = sentence(job.output);
      log.error({ lastError }, 'job given up');
      const data = definition.schema.safeParse(job.data);
      if (!data.success) return;
      const { giveUp } = await load();
      await giveUp(data.data as never, lastError, { ...context, log });
    },
  );
}

/** The error that pg-boss has kept of the last attempt. */
function sentence(output: object | null): string {
  const found = output && (messageIn(output) ?? ('value' in output ? messageIn(output.value) : undefined));
  const message = found ?? 'no message';
  if (/timeout|execution exceeded/.test(message)) return 'its worker was stopped, or took too long.';
  return /[.!?]$/.test(message) ? message : `${message}.`;
}

function messageIn(value: unknown): string | undefined {
  return value !== null && typeof value === 'object' && 'message' in value && typeof value.message === 'string'
    ? value.message
    : undefined;
}
