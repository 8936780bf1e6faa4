import type { QueryInterface } from 'sequelize';

/** Why: the arm library says in how many layouts each version stands, which would otherwise read every item there is. */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    CREATE INDEX items_arm ON items ((data ->> 'armId'), layout_id) WHERE kind = 'robot' AND removed_at IS NULL;
  `);
}

export async function down(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query('DROP INDEX items_arm;');
}
