import pg from 'pg';
import { Sequelize, Transaction } from 'sequelize';
import { env } from './env';

function connect(): Sequelize {
  return new Sequelize(env.DATABASE_URL, {
    dialect: 'postgres',
    // The server build cannot follow Sequelize's own lookup of its driver.
    dialectModule: pg,
    logging: false,
    pool: { max: env.DATABASE_POOL_MAX, min: 0, idle: 10_000, acquire: 20_000 },
    define: { underscored: true },
    // A process that stands still within a transaction would hold its rows, and everybody who waits for them, for ever.
    dialectOptions: { idle_in_transaction_session_timeout: 60_000 },
  });
}

// Development reloads modules again and again; without this every reload would open a pool of its own.
const shared = globalThis as typeof globalThis & { elbowroomSequelize?: Sequelize };
export const sequelize = (shared.elbowroomSequelize ??= connect());

/**
 * Runs `work` in a transaction and commits it when the promise resolves; any error rolls everything back.
 * With `outer` the work joins that transaction instead, so that a function can be called alone or as part of a larger one.
 */
export async function inTransaction<T>(
  work: (transaction: Transaction) => Promise<T>,
  outer?: Transaction | null,
): Promise<T> {
  if (outer) return work(outer);
  return sequelize.transaction(work);
}

export type { Transaction };
