import type { QueryInterface } from 'sequelize';

/** Why: whoever shares a revision decides who may sign it, and wants to see who opened the link and when. */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    ALTER TABLE share_links ADD COLUMN may_sign boolean NOT NULL DEFAULT false;

    CREATE TABLE share_opens (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      share_link_id uuid NOT NULL REFERENCES share_links (id) ON DELETE CASCADE,
      -- Known when this browser has remarked or signed by the same link before; else nobody knows.
      guest_name text,
      guest_email text,
      device text NOT NULL CHECK (device IN ('phone', 'tablet', 'computer', 'program')),
      created_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX share_opens_link ON share_opens (share_link_id, created_at);
  `);
}

export async function down(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    DROP TABLE share_opens;
    ALTER TABLE share_links DROP COLUMN may_sign;
  `);
}
