import type { QueryInterface } from 'sequelize';

/** Why: conveyors, section lines, notes, zones and protective devices stand on a sheet too. */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    ALTER TABLE items DROP CONSTRAINT items_kind_check;
    ALTER TABLE items ADD CONSTRAINT items_kind_check CHECK (kind IN (
      'robot', 'fixture', 'obstacle', 'guardLine', 'walkway', 'conveyor', 'dimension', 'sectionLine', 'note', 'zone',
      'protectiveDevice'));
  `);
}

/** Items of the newer kinds cannot be told in the older form: they go. */
export async function down(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    DELETE FROM items WHERE kind IN ('conveyor', 'sectionLine', 'note', 'zone', 'protectiveDevice');
    ALTER TABLE items DROP CONSTRAINT items_kind_check;
    ALTER TABLE items ADD CONSTRAINT items_kind_check CHECK (kind IN (
      'robot', 'fixture', 'obstacle', 'guardLine', 'walkway', 'dimension'));
  `);
}
