import type { QueryInterface } from 'sequelize';

/** Why: programs of a member act under a key of their own that can be taken back, never under the member's password. */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    CREATE TABLE api_tokens (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      -- Goes with the membership: whoever leaves takes no key along.
      membership_id uuid NOT NULL REFERENCES memberships (id) ON DELETE CASCADE,
      name text NOT NULL CHECK (length(name) BETWEEN 1 AND 120),
      token_hash text NOT NULL UNIQUE CHECK (length(token_hash) = 64),
      -- The first characters, by which its owner knows it again.
      hint text NOT NULL,
      role text NOT NULL CHECK (role IN ('viewer', 'planner', 'integrator', 'admin')),
      read_only boolean NOT NULL DEFAULT false,
      expires_at timestamptz NOT NULL,
      revoked_at timestamptz,
      last_used_at timestamptz,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX api_tokens_membership ON api_tokens (membership_id);
  `);
}

export async function down(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query('DROP TABLE api_tokens;');
}
