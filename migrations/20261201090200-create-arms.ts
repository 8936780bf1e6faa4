import type { QueryInterface } from 'sequelize';

/** Why: layouts, maps and revisions name one version of an arm, so a version may never change under them. */
export async function up(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    CREATE TABLE arms (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      organisation_id uuid NOT NULL REFERENCES organisations (id) ON DELETE CASCADE,
      -- Shared by all versions of one arm.
      family_id uuid NOT NULL,
      version integer NOT NULL CHECK (version >= 1),
      name text NOT NULL CHECK (length(name) BETWEEN 1 AND 120),
      description text NOT NULL DEFAULT '',
      payload_kg double precision CHECK (payload_kg >= 0),
      reach_mm double precision NOT NULL CHECK (reach_mm > 0),
      definition jsonb NOT NULL,
      created_by uuid REFERENCES users (id) ON DELETE SET NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      UNIQUE (family_id, version)
    );
    CREATE INDEX arms_organisation ON arms (organisation_id, name);

    CREATE FUNCTION refuse_arm_change() RETURNS trigger LANGUAGE plpgsql AS $body$
    BEGIN
      IF (NEW.id, NEW.organisation_id, NEW.family_id, NEW.version, NEW.name, NEW.description, NEW.payload_kg,
          NEW.reach_mm, NEW.definition, NEW.created_at)
        IS DISTINCT FROM
         (OLD.id, OLD.organisation_id, OLD.family_id, OLD.version, OLD.name, OLD.description, OLD.payload_kg,
          OLD.reach_mm, OLD.definition, OLD.created_at)
      THEN
        RAISE EXCEPTION 'A version of an arm never changes: add a new version' USING ERRCODE = 'integrity_constraint_violation';
      END IF;
      RETURN NEW;
    END;
    $body$;
    CREATE TRIGGER arms_never_change BEFORE UPDATE ON arms FOR EACH ROW EXECUTE FUNCTION refuse_arm_change();
  `);
}

export async function down(queryInterface: QueryInterface): Promise<void> {
  await queryInterface.sequelize.query(`
    DROP TABLE arms;
    DROP FUNCTION refuse_arm_change();
  `);
}
