import type { QueryInterface } from 'sequelize';

/**
 * Why: an arm that is no longer bought leaves the palette, while layouts, maps and revisions keep the version they name. The trigger
 * arms_never_change does not watch this column.
 */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query('ALTER TABLE arms ADD COLUMN archived_at timestamptz');
}

export async function down(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query('ALTER TABLE arms DROP COLUMN archived_at');
}
