import type { MigrationInterface, QueryRunner } from 'typeorm'

export class CreateSheetsAndLedger20261201000002 implements MigrationInterface {
  readonly name = 'CreateSheetsAndLedger20261201000002'

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      CREATE TABLE sheet (
        id uuid CONSTRAINT sheet_pkey PRIMARY KEY DEFAULT gen_random_uuid(),
        number varchar(20) NOT NULL,
        title text NOT NULL,
        scale integer NOT NULL,
        srid integer NOT NULL,
        neatline geometry NOT NULL,
        page_width double precision NOT NULL,
        page_height double precision NOT NULL,
        state text NOT NULL DEFAULT 'drafting',
        revision integer NOT NULL DEFAULT 0,
        linework_revision integer NOT NULL DEFAULT 0,
        edition integer,
        created_at timestamptz NOT NULL DEFAULT now(),
        CONSTRAINT sheet_state_known CHECK (state IN ('drafting', 'submitted', 'approved', 'releasing'))
      );
      CREATE UNIQUE INDEX sheet_number_unique ON sheet (number);
      ALTER TABLE membership ADD CONSTRAINT membership_sheet_fkey FOREIGN KEY (sheet_id) REFERENCES sheet (id);

      CREATE TABLE revision (
        sheet_id uuid NOT NULL CONSTRAINT revision_sheet_fkey REFERENCES sheet (id),
        number integer NOT NULL,
        kind text NOT NULL,
        author_id uuid NOT NULL CONSTRAINT revision_author_fkey REFERENCES account (id),
        at timestamptz NOT NULL DEFAULT now(),
        message text NOT NULL,
        changed integer NOT NULL,
        change_key uuid,
        body_digest text,
        altered uuid[] NOT NULL DEFAULT '{}',
        CONSTRAINT revision_pkey PRIMARY KEY (sheet_id, number),
        CONSTRAINT revision_number_positive CHECK (number > 0),
        CONSTRAINT revision_key_with_digest CHECK ((change_key IS NULL) = (body_digest IS NULL))
      );
      CREATE UNIQUE INDEX revision_change_key_unique ON revision (sheet_id, author_id, change_key)
        WHERE change_key IS NOT NULL;

      CREATE TABLE item_version (
        item_id uuid NOT NULL,
        since integer NOT NULL,
        until integer,
        sheet_id uuid NOT NULL CONSTRAINT item_version_sheet_fkey REFERENCES sheet (id),
        kind text NOT NULL,
        geometry geometry,
        properties jsonb NOT NULL,
        provenance jsonb,
        CONSTRAINT item_version_pkey PRIMARY KEY (item_id, since),
        CONSTRAINT item_version_order CHECK (until > since),
        CONSTRAINT item_version_revision_fkey FOREIGN KEY (sheet_id, since) REFERENCES revision (sheet_id, number)
      );
      CREATE UNIQUE INDEX item_version_current ON item_version (item_id) WHERE until IS NULL;
      CREATE INDEX item_version_current_kind ON item_version (sheet_id, kind) WHERE until IS NULL;
      CREATE INDEX item_version_since ON item_version (sheet_id, since);
      CREATE INDEX item_version_until ON item_version (sheet_id, until) WHERE until IS NOT NULL;
      CREATE INDEX item_version_geometry ON item_version USING gist (geometry) WHERE until IS NULL;

      CREATE TABLE face_build (
        sheet_id uuid CONSTRAINT face_build_pkey PRIMARY KEY CONSTRAINT face_build_sheet_fkey REFERENCES sheet (id),
        revision integer NOT NULL
      );
      CREATE TABLE face (
        id uuid CONSTRAINT face_pkey PRIMARY KEY DEFAULT gen_random_uuid(),
        sheet_id uuid NOT NULL CONSTRAINT face_sheet_fkey REFERENCES sheet (id),
        unit_id uuid,
        outline geometry NOT NULL
      );
      CREATE INDEX face_sheet ON face (sheet_id);
      CREATE INDEX face_outline ON face USING gist (outline);
    `)
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`
      DROP TABLE face;
      DROP TABLE face_build;
      DROP TABLE item_version;
      DROP TABLE revision;
      ALTER TABLE membership DROP CONSTRAINT membership_sheet_fkey;
      DROP TABLE sheet;
    `)
  }
}
