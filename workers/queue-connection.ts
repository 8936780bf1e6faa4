import pg from 'pg';
import type PgBoss from 'pg-boss';
import type { Logger } from 'pino';

/** A worker's connection to the queue. It is ours and not pg-boss's, so that it can be closed after the very last statement. */
export interface QueueConnection extends PgBoss.Db {
  /** Whether a statement is under way. */
  readonly busy: () => boolean;
  readonly close: () => Promise<void>;
}

export function queueConnection(connectionString: string, log: Logger): QueueConnection {
  const pool = new pg.Pool({ connectionString, max: 4, application_name: 'elbowroom worker' });
  // An idle connection that the server cuts; the next statement opens another.
  pool.on('error', (error) => log.warn({ err: error }, 'queue connection lost'));
  let underWay = 0;
  return {
    async executeSql(text, values) {
      underWay += 1;
      try {
        return await pool.query(text, values);
      } finally {
        underWay -= 1;
      }
    },
    busy: () => underWay > 0,
    close: () => pool.end(),
  };
}
