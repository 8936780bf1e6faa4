import type { QueryInterface } from 'sequelize';

/** Why: a variant is edited by several people at once, so every item carries the version that the next edit must name. */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    CREATE TABLE layouts (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      project_id uuid NOT NULL REFERENCES projects (id) ON DELETE CASCADE,
      letter text NOT NULL CHECK (letter ~ '^[A-Z]{1,2}$'),
      name text NOT NULL CHECK (length(name) BETWEEN 1 AND 120),
      -- Counts every accepted batch of edits.
      version integer NOT NULL DEFAULT 0 CHECK (version >= 0),
      floor_plan_id uuid,
      map_settings jsonb NOT NULL,
      created_by uuid REFERENCES users (id) ON DELETE SET NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now(),
      UNIQUE (project_id, letter),
      -- A floor plan of another project cannot lie under a layout.
      FOREIGN KEY (floor_plan_id, project_id) REFERENCES floor_plans (id, project_id) ON DELETE SET NULL (floor_plan_id)
    );
    CREATE INDEX layouts_floor_plan ON layouts (floor_plan_id);

    CREATE TABLE items (
      layout_id uuid NOT NULL REFERENCES layouts (id) ON DELETE CASCADE,
      -- Given by the client, so it is unique within its layout only: nobody can claim or probe an id of another layout.
      id uuid NOT NULL,
      version integer NOT NULL CHECK (version >= 1),
      kind text NOT NULL CHECK (kind IN ('robot', 'fixture', 'obstacle', 'guardLine', 'walkway', 'dimension')),
      data jsonb NOT NULL,
      -- The layout's version at the item's last change.
      layout_version integer NOT NULL CHECK (layout_version >= 0),
      -- A removed item stays as a tombstone, so that others learn of the removal.
      removed_at timestamptz,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (layout_id, id)
    );
    CREATE INDEX items_changes ON items (layout_id, layout_version);

    -- Every accepted batch, so that one sent again is answered from here and applied once.
    CREATE TABLE layout_operations (
      layout_id uuid NOT NULL REFERENCES layouts (id) ON DELETE CASCADE,
      id uuid NOT NULL,
      user_id uuid REFERENCES users (id) ON DELETE SET NULL,
      layout_version integer NOT NULL CHECK (layout_version >= 1),
      operations jsonb NOT NULL,
      result jsonb NOT NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (layout_id, id),
      UNIQUE (layout_id, layout_version)
    );
  `);
}

export async function down(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    DROP TABLE layout_operations;
    DROP TABLE items;
    DROP TABLE layouts;
  `);
}
