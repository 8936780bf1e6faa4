import type { QueryInterface } from 'sequelize';

/** Why: the same question has the same answer, so a map is stored under the hash of its question and computed once. */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    CREATE TABLE dexterity_maps (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      organisation_id uuid NOT NULL REFERENCES organisations (id) ON DELETE CASCADE,
      -- SHA-256 of the whole question and the kernel's version. Unique within the organisation, so that two who ask at
      -- the same moment share one row, and nobody learns what another organisation has asked.
      key text NOT NULL CHECK (key ~ '^[0-9a-f]{64}$'),
      input jsonb NOT NULL,
      grid jsonb NOT NULL,
      state text NOT NULL DEFAULT 'queued' CHECK (state IN ('queued', 'running', 'done', 'failed', 'cancelled')),
      -- Each try takes the next number; a write that carries an older one is refused.
      attempt integer NOT NULL DEFAULT 0 CHECK (attempt >= 0),
      tile_count integer NOT NULL CHECK (tile_count >= 1),
      tiles_done integer NOT NULL DEFAULT 0 CHECK (tiles_done BETWEEN 0 AND tile_count),
      summary jsonb,
      failure text,
      asked_by uuid REFERENCES users (id) ON DELETE SET NULL,
      started_at timestamptz,
      finished_at timestamptz,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now(),
      UNIQUE (organisation_id, key),
      CHECK (state <> 'done' OR (summary IS NOT NULL AND finished_at IS NOT NULL AND tiles_done = tile_count)),
      CHECK (state <> 'failed' OR failure IS NOT NULL)
    );
    CREATE INDEX dexterity_maps_under_way ON dexterity_maps (state, updated_at) WHERE state IN ('queued', 'running');

    CREATE TABLE map_tiles (
      map_id uuid NOT NULL REFERENCES dexterity_maps (id) ON DELETE CASCADE,
      index integer NOT NULL CHECK (index >= 0),
      attempt integer NOT NULL CHECK (attempt >= 1),
      bytes bytea NOT NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (map_id, index)
    );
    -- Floats hardly compress: spare PostgreSQL the try on every write and read.
    ALTER TABLE map_tiles ALTER COLUMN bytes SET STORAGE EXTERNAL;
  `);
}

export async function down(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    DROP TABLE map_tiles;
    DROP TABLE dexterity_maps;
  `);
}
