import type { QueryInterface } from 'sequelize';

/** Why: a project is one customer's job on one site; its floor plans are kept in the object store and set to scale here. */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    CREATE TABLE projects (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      organisation_id uuid NOT NULL REFERENCES organisations (id) ON DELETE CASCADE,
      name text NOT NULL CHECK (length(name) BETWEEN 1 AND 120),
      customer_name text NOT NULL DEFAULT '',
      site_name text NOT NULL DEFAULT '',
      archived_at timestamptz,
      created_by uuid REFERENCES users (id) ON DELETE SET NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now(),
      UNIQUE (id, organisation_id)
    );
    CREATE INDEX projects_organisation ON projects (organisation_id, updated_at DESC);

    -- The projects a viewer may look at. Both foreign keys name the organisation: no grant can cross two.
    CREATE TABLE project_viewers (
      project_id uuid NOT NULL,
      membership_id uuid NOT NULL,
      organisation_id uuid NOT NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (project_id, membership_id),
      FOREIGN KEY (project_id, organisation_id) REFERENCES projects (id, organisation_id) ON DELETE CASCADE,
      FOREIGN KEY (membership_id, organisation_id) REFERENCES memberships (id, organisation_id) ON DELETE CASCADE
    );
    CREATE INDEX project_viewers_membership ON project_viewers (membership_id);

    CREATE TABLE floor_plans (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      project_id uuid NOT NULL REFERENCES projects (id) ON DELETE CASCADE,
      name text NOT NULL CHECK (length(name) BETWEEN 1 AND 200),
      -- Size of the upright picture.
      width_px integer NOT NULL CHECK (width_px > 0),
      height_px integer NOT NULL CHECK (height_px > 0),
      -- Folder of the original and of every display size in the object store.
      object_prefix text NOT NULL UNIQUE,
      original_media_type text NOT NULL CHECK (original_media_type IN ('image/png', 'image/jpeg', 'image/webp')),
      original_bytes integer NOT NULL CHECK (original_bytes > 0),
      picture_widths integer[] NOT NULL CHECK (cardinality(picture_widths) > 0),
      calibration jsonb,
      created_by uuid REFERENCES users (id) ON DELETE SET NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now(),
      UNIQUE (id, project_id)
    );
    CREATE INDEX floor_plans_project ON floor_plans (project_id, created_at);
  `);
}

export async function down(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    DROP TABLE floor_plans;
    DROP TABLE project_viewers;
    DROP TABLE projects;
  `);
}
