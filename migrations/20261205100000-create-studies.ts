import type { QueryInterface } from 'sequelize';

/** Why: a study of where things may stand takes as long as a map, and the same question has the same answer. */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    CREATE TABLE studies (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      organisation_id uuid NOT NULL REFERENCES organisations (id) ON DELETE CASCADE,
      -- SHA-256 of the whole question, the arm and the kernel's version; unique within the organisation, as with maps.
      key text NOT NULL CHECK (key ~ '^[0-9a-f]{64}$'),
      input jsonb NOT NULL,
      state text NOT NULL DEFAULT 'queued' CHECK (state IN ('queued', 'running', 'done', 'failed', 'cancelled')),
      -- Each try takes the next number; a write that carries an older one is refused.
      attempt integer NOT NULL DEFAULT 0 CHECK (attempt >= 0),
      slice_count integer NOT NULL CHECK (slice_count >= 1),
      slices_done integer NOT NULL DEFAULT 0 CHECK (slices_done BETWEEN 0 AND slice_count),
      answer jsonb,
      failure text,
      asked_by uuid REFERENCES users (id) ON DELETE SET NULL,
      started_at timestamptz,
      finished_at timestamptz,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now(),
      UNIQUE (organisation_id, key),
      CHECK (state <> 'done' OR (answer IS NOT NULL AND finished_at IS NOT NULL AND slices_done = slice_count)),
      CHECK (state <> 'failed' OR failure IS NOT NULL)
    );
    CREATE INDEX studies_under_way ON studies (organisation_id) WHERE state IN ('queued', 'running');

    CREATE TABLE study_slices (
      study_id uuid NOT NULL REFERENCES studies (id) ON DELETE CASCADE,
      index integer NOT NULL CHECK (index >= 0),
      attempt integer NOT NULL CHECK (attempt >= 1),
      result jsonb NOT NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (study_id, index)
    );
  `);
}

export async function down(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    DROP TABLE study_slices;
    DROP TABLE studies;
  `);
}
