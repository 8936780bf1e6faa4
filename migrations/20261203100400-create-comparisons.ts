import type { QueryInterface } from 'sequelize';

/** Why: a comparison that was argued over is kept under a name, with the sheets and the question that it was made of. */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    CREATE TABLE comparisons (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      project_id uuid NOT NULL REFERENCES projects (id) ON DELETE CASCADE,
      name text NOT NULL CHECK (length(name) BETWEEN 1 AND 120),
      -- Two to four, as the address writes them: "layout:<id>" or "revision:<id>".
      sheets jsonb NOT NULL CHECK (jsonb_typeof(sheets) = 'array' AND jsonb_array_length(sheets) BETWEEN 2 AND 4),
      view jsonb NOT NULL,
      created_by uuid REFERENCES users (id) ON DELETE SET NULL,
      created_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX comparisons_project ON comparisons (project_id, created_at);
  `);
}

export async function down(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query('DROP TABLE comparisons;');
}
