import type { QueryInterface } from 'sequelize';

/**
 * Why: planners on one sheet see one another's cursors, whichever web process each of them talks to. Unlogged, since nothing in it is
 * worth more than a few seconds.
 */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    CREATE UNLOGGED TABLE presences (
      layout_id uuid NOT NULL REFERENCES layouts (id) ON DELETE CASCADE,
      -- One opened page; made by the browser.
      seat uuid NOT NULL,
      user_id uuid NOT NULL REFERENCES users (id) ON DELETE CASCADE,
      -- Where the pointer is on the floor; null while it is elsewhere.
      x_mm double precision,
      y_mm double precision,
      item_ids jsonb NOT NULL DEFAULT '[]',
      seen_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (layout_id, seat)
    );
  `);
}

export async function down(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query('DROP TABLE presences');
}
