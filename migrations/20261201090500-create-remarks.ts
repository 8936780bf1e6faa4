import type { QueryInterface } from 'sequelize';

/** Why: a customer pins what worries them to a spot of a revision, as a member or as a guest of a share link. */
export async function up(queryInterface: QueryInterface): Promise<void> {
  // Either a member, or a guest who came by a link and gave a name and an address; never both, never neither.
  const author = `
      user_id uuid REFERENCES users (id),
      guest_name text CHECK (length(guest_name) BETWEEN 1 AND 120),
      guest_email text CHECK (guest_email = lower(guest_email)),
      share_link_id uuid REFERENCES share_links (id),
      -- How the reader sees the author, kept as it was when they wrote: roles change later.
      author_side text NOT NULL CHECK (author_side IN ('integrator', 'customer')),
      CHECK (
        (user_id IS NOT NULL AND num_nonnulls(guest_name, guest_email, share_link_id) = 0)
        OR (user_id IS NULL AND num_nonnulls(guest_name, guest_email, share_link_id) = 3 AND author_side = 'customer')
      ),`;
  await queryInterface.sequelize.query(`
    CREATE TABLE remarks (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      revision_id uuid NOT NULL,
      layout_id uuid NOT NULL,
      -- Shown in the pin; counts within the layout.
      number integer NOT NULL CHECK (number >= 1),
      x_mm double precision NOT NULL,
      y_mm double precision NOT NULL,
      item_id uuid,
      body text NOT NULL CHECK (length(body) BETWEEN 1 AND 4000),
      ${author}
      resolved_at timestamptz,
      resolved_by uuid REFERENCES users (id) ON DELETE SET NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now(),
      UNIQUE (layout_id, number),
      FOREIGN KEY (revision_id, layout_id) REFERENCES revisions (id, layout_id) ON DELETE CASCADE
    );
    CREATE INDEX remarks_revision ON remarks (revision_id);

    CREATE TABLE remark_replies (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      remark_id uuid NOT NULL REFERENCES remarks (id) ON DELETE CASCADE,
      body text NOT NULL CHECK (length(body) BETWEEN 1 AND 4000),
      ${author}
      created_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX remark_replies_remark ON remark_replies (remark_id, created_at);
  `);
}

export async function down(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    DROP TABLE remark_replies;
    DROP TABLE remarks;
  `);
}
