import { readdir } from 'node:fs/promises';
import path from 'node:path';
import pg from 'pg';
import { QueryTypes, Sequelize } from 'sequelize';
import type { QueryInterface } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { sequelize as shared } from '@/lib/server/database';
import { env } from '@/lib/server/env';

interface Migration {
  up(queryInterface: QueryInterface): Promise<void>;
  down(queryInterface: QueryInterface): Promise<void>;
}

const folder = path.resolve('migrations');
const database = `migrations_${process.pid}`;
let own: Sequelize;
let migrations: Migration[];

/** Columns, constraints, indexes and triggers of the public schema, in a stable order. */
async function catalogue(): Promise<string[]> {
  const rows = await own.query<{ line: string }>(
    `SELECT format('column %s.%s %s %s %s', table_name, column_name, data_type, is_nullable, column_default) AS line
       FROM information_schema.columns WHERE table_schema = 'public'
     UNION ALL
     SELECT format('constraint %s %s', conrelid::regclass, pg_get_constraintdef(oid))
       FROM pg_constraint WHERE connamespace = 'public'::regnamespace
     UNION ALL SELECT 'index ' || indexdef FROM pg_indexes WHERE schemaname = 'public'
     UNION ALL SELECT 'trigger ' || pg_get_triggerdef(oid) FROM pg_trigger WHERE NOT tgisinternal
     UNION ALL SELECT 'function ' || pg_get_functiondef(oid) FROM pg_proc WHERE pronamespace = 'public'::regnamespace
     ORDER BY line`,
    { type: QueryTypes.SELECT },
  );
  return rows.map((row) => row.line);
}

async function upAll(): Promise<void> {
  for (const migration of migrations) await migration.up(own.getQueryInterface());
}

beforeAll(async () => {
  await shared.query(`CREATE DATABASE ${database}`);
  const address = new URL(env.DATABASE_URL);
  address.pathname = `/${database}`;
  own = new Sequelize(address.href, { dialect: 'postgres', dialectModule: pg, logging: false, pool: { max: 1 } });
  const files = (await readdir(folder)).filter((file) => file.endsWith('.ts')).sort();
  migrations = await Promise.all(
    files.map(async (file) => (await import(/* @vite-ignore */ path.join(folder, file))) as Migration),
  );
});

afterAll(async () => {
  await own?.close();
  await shared.query(`DROP DATABASE IF EXISTS ${database}`);
});

describe('the migrations', () => {
  it('go up, down to nothing and up again to the same tables', async () => {
    await upAll();
    const first = await catalogue();
    expect(first).toContain('column users.email text NO ');

    for (const migration of [...migrations].reverse()) await migration.down(own.getQueryInterface());
    expect(await catalogue()).toEqual([]);

    await upAll();
    expect(await catalogue()).toEqual(first);
  });

  it('leave every foreign key that is followed often with an index to follow it by', async () => {
    const rows = await own.query<{ line: string }>(
      `SELECT format('%s(%s)', c.conrelid::regclass, a.attname) AS line
         FROM pg_constraint c JOIN pg_attribute a ON a.attrelid = c.conrelid AND a.attnum = c.conkey[1]
        WHERE c.contype = 'f' AND c.connamespace = 'public'::regnamespace
          -- Who wrote, asked or revoked is read by the row, never looked up by the person.
          AND a.attname NOT IN ('created_by', 'issued_by', 'asked_by', 'invited_by', 'resolved_by', 'user_id', 'share_link_id')
          AND NOT EXISTS (SELECT 1 FROM pg_index i WHERE i.indrelid = c.conrelid AND i.indkey[0] = c.conkey[1])`,
      { type: QueryTypes.SELECT },
    );
    expect(rows.map((row) => row.line)).toEqual([]);
  });
});
