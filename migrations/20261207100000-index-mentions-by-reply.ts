import type { QueryInterface } from 'sequelize';

/** Why: when a reply goes, its mentions go with it, and would otherwise be looked for among all mentions there are. */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query('CREATE INDEX remark_mentions_reply ON remark_mentions (reply_id);');
}

export async function down(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query('DROP INDEX remark_mentions_reply;');
}
