import type { QueryInterface } from 'sequelize';

/** Why: a customer's yes or no must stay as it was given, bound to the very content that they saw. */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    ALTER TABLE revisions ADD CONSTRAINT revisions_id_sha256 UNIQUE (id, sha256);

    CREATE TABLE sign_offs (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      revision_id uuid NOT NULL,
      -- Of the content that was on the signer's screen; the foreign key demands that it is the revision's own.
      sha256 text NOT NULL,
      decision text NOT NULL CHECK (decision IN ('accepted', 'changes_requested')),
      note text NOT NULL DEFAULT '' CHECK (length(note) <= 4000),
      user_id uuid REFERENCES users (id),
      share_link_id uuid REFERENCES share_links (id),
      -- As they were at the moment of signing, for members too: names and addresses change later.
      signer_name text NOT NULL CHECK (length(signer_name) BETWEEN 1 AND 120),
      signer_email text NOT NULL CHECK (signer_email = lower(signer_email)),
      created_at timestamptz NOT NULL DEFAULT now(),
      CHECK (num_nonnulls(user_id, share_link_id) = 1),
      -- No cascade: a signed revision cannot be deleted.
      FOREIGN KEY (revision_id, sha256) REFERENCES revisions (id, sha256)
    );
    CREATE INDEX sign_offs_revision ON sign_offs (revision_id, created_at);

    CREATE FUNCTION refuse_sign_off_change() RETURNS trigger LANGUAGE plpgsql AS $body$
    BEGIN
      RAISE EXCEPTION 'A sign-off never changes: sign again' USING ERRCODE = 'integrity_constraint_violation';
    END;
    $body$;
    CREATE TRIGGER sign_offs_never_change BEFORE UPDATE OR DELETE ON sign_offs
      FOR EACH ROW EXECUTE FUNCTION refuse_sign_off_change();
  `);
}

export async function down(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    DROP TABLE sign_offs;
    DROP FUNCTION refuse_sign_off_change();
    ALTER TABLE revisions DROP CONSTRAINT revisions_id_sha256;
  `);
}
