import type { QueryInterface } from 'sequelize';

/** Why: people choose to get mails at once, once a day or not at all, members and guests alike; hence by address. */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    CREATE TABLE mail_choices (
      email text PRIMARY KEY CHECK (email = lower(email)),
      choice text NOT NULL CHECK (choice IN ('at_once', 'daily', 'none')),
      updated_at timestamptz NOT NULL DEFAULT now()
    );

    -- What waits for the daily mail. digest_id is the mail that has taken the entry: a repeated attempt takes the same ones.
    CREATE TABLE digest_entries (
      id uuid PRIMARY KEY,
      email text NOT NULL CHECK (email = lower(email)),
      template text NOT NULL,
      data jsonb NOT NULL,
      digest_id uuid,
      created_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX digest_entries_email ON digest_entries (email, digest_id);
  `);
}

export async function down(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    DROP TABLE digest_entries;
    DROP TABLE mail_choices;
  `);
}
