import type { QueryInterface } from 'sequelize';

/**
 * Why: an organisation owns everything it plans, and a person acts only through a membership in one.
 * One string of statements, so that PostgreSQL runs it as one transaction.
 */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    CREATE TABLE organisations (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      name text NOT NULL CHECK (length(name) BETWEEN 1 AND 120),
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now()
    );

    CREATE TABLE users (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      -- Lower case only, so that one mailbox is one account.
      email text NOT NULL UNIQUE CHECK (email = lower(email) AND length(email) BETWEEN 3 AND 254),
      name text NOT NULL CHECK (length(name) BETWEEN 1 AND 120),
      password_hash text NOT NULL,
      -- Goes up when the password changes: sessions that carry an older number are over.
      session_generation integer NOT NULL DEFAULT 1 CHECK (session_generation >= 1),
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now()
    );

    CREATE TABLE memberships (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      organisation_id uuid NOT NULL REFERENCES organisations (id) ON DELETE CASCADE,
      -- Unique: a person belongs to one organisation, so a session never has to choose between two.
      user_id uuid NOT NULL UNIQUE REFERENCES users (id) ON DELETE CASCADE,
      role text NOT NULL CHECK (role IN ('viewer', 'planner', 'integrator', 'admin')),
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now(),
      -- For the foreign key of project_viewers, which must not cross organisations.
      UNIQUE (id, organisation_id)
    );
    CREATE INDEX memberships_organisation ON memberships (organisation_id);
  `);
}

export async function down(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    DROP TABLE memberships;
    DROP TABLE users;
    DROP TABLE organisations;
  `);
}
