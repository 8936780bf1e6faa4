import type { QueryInterface } from 'sequelize';

/** Why: an admin can read who did what, and guessing passwords is slowed down on every web process alike. */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    CREATE TABLE audit_events (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      organisation_id uuid NOT NULL REFERENCES organisations (id) ON DELETE CASCADE,
      user_id uuid REFERENCES users (id) ON DELETE SET NULL,
      share_link_id uuid REFERENCES share_links (id) ON DELETE SET NULL,
      -- Such as member.role_changed, revision.issued.
      action text NOT NULL CHECK (action ~ '^[a-z_]+\\.[a-z_]+$'),
      subject_id uuid,
      details jsonb NOT NULL DEFAULT '{}',
      created_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX audit_events_organisation ON audit_events (organisation_id, created_at DESC);

    -- The shape that rate-limiter-flexible expects of its PostgreSQL store.
    CREATE TABLE rate_limits (
      key varchar(255) PRIMARY KEY,
      points integer NOT NULL DEFAULT 0,
      expire bigint
    );
    CREATE INDEX rate_limits_expire ON rate_limits (expire);
  `);
}

export async function down(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    DROP TABLE rate_limits;
    DROP TABLE audit_events;
  `);
}
