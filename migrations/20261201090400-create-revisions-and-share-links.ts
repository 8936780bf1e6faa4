import type { QueryInterface } from 'sequelize';

/** Why: an issued revision is what a customer signs, so the database itself refuses to change what it froze. */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    CREATE TABLE revisions (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      -- No cascade: a layout with an issued revision cannot be deleted.
      layout_id uuid NOT NULL REFERENCES layouts (id),
      number integer NOT NULL CHECK (number >= 1),
      state text NOT NULL DEFAULT 'issued' CHECK (state IN ('issued', 'accepted', 'changes_requested', 'superseded')),
      note text NOT NULL DEFAULT '',
      snapshot jsonb NOT NULL,
      sha256 text NOT NULL CHECK (sha256 ~ '^[0-9a-f]{64}$'),
      issued_by uuid REFERENCES users (id) ON DELETE SET NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now(),
      UNIQUE (layout_id, number),
      UNIQUE (id, layout_id)
    );

    CREATE FUNCTION refuse_revision_change() RETURNS trigger LANGUAGE plpgsql AS $body$
    BEGIN
      IF (NEW.id, NEW.layout_id, NEW.number, NEW.note, NEW.snapshot, NEW.sha256, NEW.created_at)
        IS DISTINCT FROM (OLD.id, OLD.layout_id, OLD.number, OLD.note, OLD.snapshot, OLD.sha256, OLD.created_at)
      THEN
        RAISE EXCEPTION 'An issued revision never changes: issue a new one' USING ERRCODE = 'integrity_constraint_violation';
      END IF;
      RETURN NEW;
    END;
    $body$;
    CREATE TRIGGER revisions_never_change BEFORE UPDATE ON revisions FOR EACH ROW EXECUTE FUNCTION refuse_revision_change();

    CREATE TABLE share_links (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      revision_id uuid NOT NULL REFERENCES revisions (id) ON DELETE CASCADE,
      -- SHA-256 of the token; the token itself is shown once and not kept.
      token_hash text NOT NULL UNIQUE CHECK (token_hash ~ '^[0-9a-f]{64}$'),
      label text NOT NULL DEFAULT '',
      may_remark boolean NOT NULL DEFAULT true,
      expires_at timestamptz NOT NULL,
      revoked_at timestamptz,
      open_count integer NOT NULL DEFAULT 0 CHECK (open_count >= 0),
      last_opened_at timestamptz,
      created_by uuid REFERENCES users (id) ON DELETE SET NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now(),
      CHECK (expires_at > created_at)
    );
    CREATE INDEX share_links_revision ON share_links (revision_id);
  `);
}

export async function down(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    DROP TABLE share_links;
    DROP TABLE revisions;
    DROP FUNCTION refuse_revision_change();
  `);
}
