import { readdir } from 'node:fs/promises';
import path from 'node:path';
import pg from 'pg';
import type { QueryInterface } from 'sequelize';
import { sequelize } from '@/lib/server/database';
import { env } from '@/lib/server/env';
import { prepareQueues } from '@/lib/server/queue';

/**
 * For tests that start worker processes: in the shared database those would also take the jobs of other tests. Such a test
 * names a database of its own in DATABASE_URL within vi.hoisted, before anything reads the environment.
 */

/** Statements that concern whole databases go through the one that was there first. */
async function onServer(adminUrl: string, statement: string): Promise<void> {
  const client = new pg.Client(adminUrl);
  await client.connect();
  try {
    await client.query(statement);
  } finally {
    await client.end();
  }
}

const nameOf = (url: string): string => new URL(url).pathname.slice(1);

/** Makes the database that DATABASE_URL names by now, with all tables and queues. */
export async function makeOwnDatabase(adminUrl: string): Promise<void> {
  await onServer(adminUrl, `DROP DATABASE IF EXISTS ${nameOf(env.DATABASE_URL)} WITH (FORCE)`);
  await onServer(adminUrl, `CREATE DATABASE ${nameOf(env.DATABASE_URL)}`);
  const folder = path.resolve('migrations');
  const files = (await readdir(folder)).filter((file) => file.endsWith('.ts')).sort();
  for (const file of files) {
    const migration = (await import(/* @vite-ignore */ path.join(folder, file))) as {
      up(queryInterface: QueryInterface): Promise<void>;
    };
    await migration.up(sequelize.getQueryInterface());
  }
  await prepareQueues();
}

export async function dropOwnDatabase(adminUrl: string): Promise<void> {
  await sequelize.close();
  await onServer(adminUrl, `DROP DATABASE IF EXISTS ${nameOf(env.DATABASE_URL)} WITH (FORCE)`);
}
