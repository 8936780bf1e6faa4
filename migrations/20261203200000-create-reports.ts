import type { QueryInterface } from 'sequelize';

/** Why: a report takes longer than a request, so it is made by a job and kept in the object store for whoever may see its sheet. */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    CREATE TABLE reports (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      organisation_id uuid NOT NULL REFERENCES organisations (id) ON DELETE CASCADE,
      layout_id uuid NOT NULL REFERENCES layouts (id) ON DELETE CASCADE,
      -- Null for a report of the draft.
      revision_id uuid REFERENCES revisions (id) ON DELETE CASCADE,
      options jsonb NOT NULL,
      -- The sheet as it was when the report was asked for; the same again at every attempt.
      input jsonb NOT NULL,
      state text NOT NULL DEFAULT 'queued' CHECK (state IN ('queued', 'running', 'done', 'failed')),
      attempt integer NOT NULL DEFAULT 1 CHECK (attempt >= 1),
      done integer NOT NULL DEFAULT 0 CHECK (done >= 0),
      total integer NOT NULL DEFAULT 1 CHECK (total >= 1),
      failure text,
      file_name text NOT NULL,
      object_key text,
      bytes integer,
      sha256 text CHECK (length(sha256) = 64),
      pages integer,
      asked_by uuid REFERENCES users (id) ON DELETE SET NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now(),
      finished_at timestamptz,
      CHECK (state <> 'done' OR (object_key IS NOT NULL AND bytes IS NOT NULL AND sha256 IS NOT NULL))
    );
    CREATE INDEX reports_layout ON reports (layout_id, created_at DESC);
    CREATE INDEX reports_revision ON reports (revision_id, created_at DESC);
    CREATE INDEX reports_organisation ON reports (organisation_id);
  `);
}

export async function down(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query('DROP TABLE reports;');
}
