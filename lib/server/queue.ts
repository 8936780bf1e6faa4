import PgBoss from 'pg-boss';
import { QueryTypes, type Transaction } from 'sequelize';
import type { z } from 'zod';
import { sequelize } from './database';
import { env } from './env';
import { deadLetterOf, JOBS, type JobDefinition } from './jobs';

/** PostgreSQL schema that holds the queue's tables, apart from ours. */
export const QUEUE_SCHEMA = 'queue';

/**
 * Makes the queue's schema and a queue with a dead letter for every job; repeats do no harm. Part of the migrate step:
 * neither the web processes nor the workers create anything.
 */
export async function prepareQueues(): Promise<void> {
  const boss = new PgBoss({
    connectionString: env.DATABASE_URL,
    schema: QUEUE_SCHEMA,
    max: 1,
    supervise: false,
    schedule: false,
  });
  await boss.start();
  try {
    for (const definition of JOBS) {
      const deadLetter = deadLetterOf(definition);
      await boss.createQueue(deadLetter, { name: deadLetter, retryLimit: 10, retryDelay: 30, retryBackoff: true });
      const options = { name: definition.name, ...definition.options, deadLetter };
      await boss.createQueue(definition.name, options);
      // An existing queue keeps its old numbers unless told.
      await boss.updateQueue(definition.name, options);
    }
  } finally {
    await boss.stop({ graceful: false });
  }
}

/** Statements of the queue go through the caller's transaction: a job exists if, and only if, the row that it serves does. */
function databaseOf(transaction: Transaction): PgBoss.Db {
  return {
    async executeSql(text, values) {
      // Sequelize refuses undefined where the driver would have written NULL.
      const bind = values.map((value) => (value === undefined ? null : value));
      const rows = await sequelize.query<object>(text, { bind, transaction, type: QueryTypes.SELECT });
      return { rows };
    },
  };
}

// Never started: it only writes the statements, the caller's transaction runs them.
const sender = new PgBoss({
  db: { executeSql: () => Promise.reject(new Error('The queue is only written to within a transaction.')) },
  schema: QUEUE_SCHEMA,
  supervise: false,
  schedule: false,
  migrate: false,
});

interface EnqueueOptions {
  /** The transaction that writes the row which the job serves. */
  transaction: Transaction;
  /** Not before this moment. */
  startAfter?: Date;
}

/**
 * Puts a job into its queue as part of the transaction.
 * @throws ZodError where the data does not fit the job, Error where the queue does not exist.
 */
export async function enqueue<S extends z.ZodType<object>>(
  definition: JobDefinition<S>,
  data: z.input<S>,
  { transaction, startAfter }: EnqueueOptions,
): Promise<string> {
  const id = await sender.send(definition.name, definition.schema.parse(data), {
    db: databaseOf(transaction),
    ...(startAfter && { startAfter }),
  });
  // pg-boss answers a missing queue with null and drops the job; whoever waits for it would wait for ever.
  if (id === null) throw missingQueue(definition);
  return id;
}

interface EnqueueAllOptions extends Pick<EnqueueOptions, 'transaction'> {
  /** Higher ones are taken first; 0 unless given. */
  priority?: number;
  /** In place of what the definition says. */
  expireInSeconds?: number;
}

/** The same for many jobs of one kind in one statement. */
export async function enqueueAll<S extends z.ZodType<object>>(
  definition: JobDefinition<S>,
  list: readonly z.input<S>[],
  { transaction, ...each }: EnqueueAllOptions,
): Promise<void> {
  const db = databaseOf(transaction);
  const jobs = list.map((data) => ({ name: definition.name, data: definition.schema.parse(data), ...each }));
  const { rows } = await db.executeSql(`SELECT 1 FROM ${QUEUE_SCHEMA}.queue WHERE name = $1`, [definition.name]);
  if (rows.length === 0) throw missingQueue(definition);
  await sender.insert(jobs, { db });
}

function missingQueue({ name }: JobDefinition): Error {
  return new Error(`The queue "${name}" does not exist. Run the migrate step, which makes it.`);
}
