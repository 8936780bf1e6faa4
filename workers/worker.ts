import './load-env';
import { availableParallelism } from 'node:os';
import { setTimeout } from 'node:timers/promises';
import PgBoss from 'pg-boss';
import { sequelize } from '@/lib/server/database';
import { env } from '@/lib/server/env';
import { logger } from '@/lib/server/logger';
import { QUEUE_SCHEMA } from '@/lib/server/queue';
import { queueConnection } from './queue-connection';
import { takeJobs } from './take-jobs';
import { mapPool } from './threads/map-pool';

/**
 * Takes jobs from the queue until it is told to stop. Any number of these may run, on any number of hosts; they share
 * nothing but the database.
 */

/** How long a stop waits for jobs to end; what is not done by then goes back into the queue. */
const STOP_TIMEOUT_MS = 15_000;
/** How often the workers together look for jobs whose worker has vanished. */
const MAINTENANCE_SECONDS = 5;

const log = logger.child({ process: 'worker', pid: process.pid });
// One core is left to the database and the web processes where they share the machine.
const threads = env.MAP_THREADS ?? Math.max(1, availableParallelism() - 1);

const maps = mapPool(threads);
const queue = queueConnection(env.DATABASE_URL, log);
const boss = new PgBoss({
  db: queue,
  schema: QUEUE_SCHEMA,
  migrate: false,
  schedule: false,
  maintenanceIntervalSeconds: MAINTENANCE_SECONDS,
});
boss.on('error', (error) => log.error({ err: error }, 'queue error'));

// pg-boss does not wait for the note that a job is done. Where the database is away just then, the job is taken again
// after its time has run out, which every handler bears; the worker itself has no reason to fall.
process.on('unhandledRejection', (error) => log.error({ err: error }, 'unhandled rejection'));

let jobInHand = (): boolean => false;

/**
 * pg-boss forgets a job that it was fetching at the moment of the stop: the job would stay with a worker that is gone until
 * its time has run out. So the connection stays open until nothing is under way.
 */
async function settle(deadline: number): Promise<void> {
  while ((jobInHand() || queue.busy()) && Date.now() < deadline) await setTimeout(20);
}

let stopping = false;
async function stop(signal: string): Promise<void> {
  if (stopping) return;
  stopping = true;
  log.info({ signal }, 'worker stopping');
  const deadline = Date.now() + STOP_TIMEOUT_MS;
  await boss.stop({ graceful: true, wait: true, timeout: STOP_TIMEOUT_MS });
  await settle(deadline);
  await queue.close();
  await maps.close();
  await sequelize.close();
  log.info('worker stopped');
  process.exit(0);
}
for (const signal of ['SIGTERM', 'SIGINT'] as const) process.on(signal, () => void stop(signal));

try {
  await boss.start();
  jobInHand = await takeJobs(boss, { maps, studies: maps, log }, threads);
  log.info({ threads }, 'worker ready');
} catch (error) {
  log.fatal({ err: error }, 'worker cannot start: is the database there, and has the migrate step been run?');
  process.exit(1);
}
