import type { QueryInterface } from 'sequelize';

/** Why: a remark is somebody's to answer by a day, names people, carries pictures, and each reader has read it or not. */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    ALTER TABLE remarks
      ADD COLUMN assignee_id uuid REFERENCES users (id) ON DELETE SET NULL,
      ADD COLUMN due_on date;
    CREATE INDEX remarks_assignee ON remarks (assignee_id) WHERE assignee_id IS NOT NULL;

    CREATE TABLE remark_mentions (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      remark_id uuid NOT NULL REFERENCES remarks (id) ON DELETE CASCADE,
      -- Null where the remark itself names the person.
      reply_id uuid REFERENCES remark_replies (id) ON DELETE CASCADE,
      user_id uuid NOT NULL REFERENCES users (id) ON DELETE CASCADE,
      created_at timestamptz NOT NULL DEFAULT now(),
      UNIQUE NULLS NOT DISTINCT (remark_id, reply_id, user_id)
    );

    CREATE TABLE remark_pictures (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      remark_id uuid NOT NULL REFERENCES remarks (id) ON DELETE CASCADE,
      object_key text NOT NULL UNIQUE,
      width_px integer NOT NULL CHECK (width_px >= 1),
      height_px integer NOT NULL CHECK (height_px >= 1),
      created_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX remark_pictures_remark ON remark_pictures (remark_id, created_at);

    CREATE TABLE remark_reads (
      remark_id uuid NOT NULL REFERENCES remarks (id) ON DELETE CASCADE,
      user_id uuid NOT NULL REFERENCES users (id) ON DELETE CASCADE,
      read_at timestamptz NOT NULL,
      PRIMARY KEY (remark_id, user_id)
    );
  `);
}

export async function down(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    DROP TABLE remark_reads;
    DROP TABLE remark_pictures;
    DROP TABLE remark_mentions;
    ALTER TABLE remarks DROP COLUMN assignee_id, DROP COLUMN due_on;
  `);
}
