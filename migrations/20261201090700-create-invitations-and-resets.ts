import type { QueryInterface } from 'sequelize';

/** Why: people come in and come back by a link in an e-mail; only the hash of the link's token is kept. */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    CREATE TABLE invitations (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      organisation_id uuid NOT NULL REFERENCES organisations (id) ON DELETE CASCADE,
      email text NOT NULL CHECK (email = lower(email)),
      role text NOT NULL CHECK (role IN ('viewer', 'planner', 'integrator', 'admin')),
      -- For a viewer: the projects they will see.
      project_ids uuid[] NOT NULL DEFAULT '{}',
      token_hash text NOT NULL UNIQUE CHECK (token_hash ~ '^[0-9a-f]{64}$'),
      invited_by uuid REFERENCES users (id) ON DELETE SET NULL,
      expires_at timestamptz NOT NULL,
      accepted_at timestamptz,
      revoked_at timestamptz,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE UNIQUE INDEX invitations_open ON invitations (organisation_id, email)
      WHERE accepted_at IS NULL AND revoked_at IS NULL;

    CREATE TABLE password_resets (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      user_id uuid NOT NULL REFERENCES users (id) ON DELETE CASCADE,
      token_hash text NOT NULL UNIQUE CHECK (token_hash ~ '^[0-9a-f]{64}$'),
      expires_at timestamptz NOT NULL,
      used_at timestamptz,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX password_resets_user ON password_resets (user_id);

    -- Mails that the SMTP server has taken: a job that is tried again does not send them twice.
    CREATE TABLE mail_deliveries (
      id uuid PRIMARY KEY,
      template text NOT NULL,
      created_at timestamptz NOT NULL DEFAULT now()
    );
  `);
}

export async function down(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    DROP TABLE mail_deliveries;
    DROP TABLE password_resets;
    DROP TABLE invitations;
  `);
}
