import type { MigrationInterface, QueryRunner } from 'typeorm'

export class TellAndNameRevisions20261201000101 implements MigrationInterface {
  readonly name = 'TellAndNameRevisions20261201000101'

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      ALTER TABLE revision
        ADD COLUMN what text NOT NULL DEFAULT '',
        ADD COLUMN kinds text[] NOT NULL DEFAULT '{}',
        ADD COLUMN extent geometry;
      -- Entries from before are told by their message.
      UPDATE revision SET what = message, kinds = touched.kinds, extent = touched.extent
      FROM (
        SELECT version.sheet_id, entry.number, array_agg(DISTINCT version.kind) AS kinds,
          ST_SetSRID(ST_Extent(version.geometry)::geometry, max(sheet.srid)) AS extent
        FROM item_version AS version
        JOIN sheet ON sheet.id = version.sheet_id
        CROSS JOIN LATERAL (VALUES (version.since), (version.until)) AS entry (number)
        WHERE entry.number IS NOT NULL
        GROUP BY version.sheet_id, entry.number
      ) AS touched
      WHERE touched.sheet_id = revision.sheet_id AND touched.number = revision.number;
      CREATE INDEX revision_of_author ON revision (sheet_id, author_id, number);
      CREATE INDEX revision_extent ON revision USING gist (extent);

      CREATE TABLE named_revision (
        sheet_id uuid NOT NULL,
        revision integer NOT NULL,
        name text NOT NULL,
        note text NOT NULL DEFAULT '',
        named_by uuid NOT NULL CONSTRAINT named_revision_named_by_fkey REFERENCES account (id),
        at timestamptz NOT NULL DEFAULT now(),
        CONSTRAINT named_revision_pkey PRIMARY KEY (sheet_id, revision),
        CONSTRAINT named_revision_has_name CHECK (name <> ''),
        CONSTRAINT named_revision_revision_fkey FOREIGN KEY (sheet_id, revision) REFERENCES revision (sheet_id, number)
      );
      CREATE UNIQUE INDEX named_revision_name_unique ON named_revision (sheet_id, name);
    `)
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`
      DROP TABLE named_revision;
      ALTER TABLE revision DROP COLUMN what, DROP COLUMN kinds, DROP COLUMN extent;
      DROP INDEX revision_of_author;
    `)
  }
}
