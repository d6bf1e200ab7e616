import type { MigrationInterface, QueryRunner } from 'typeorm'

export class CreateIntake20261201000003 implements MigrationInterface {
  readonly name = 'CreateIntake20261201000003'

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      CREATE TABLE intake (
        id uuid CONSTRAINT intake_pkey PRIMARY KEY DEFAULT gen_random_uuid(),
        sheet_id uuid NOT NULL CONSTRAINT intake_sheet_fkey REFERENCES sheet (id),
        account_id uuid NOT NULL CONSTRAINT intake_account_fkey REFERENCES account (id),
        file text NOT NULL,
        bytes integer NOT NULL,
        sha256 char(64) NOT NULL,
        storage_key text NOT NULL,
        state text NOT NULL DEFAULT 'read',
        crs jsonb,
        summary jsonb NOT NULL,
        mapping jsonb,
        report jsonb,
        revision integer,
        created_at timestamptz NOT NULL DEFAULT now(),
        CONSTRAINT intake_state_known CHECK (state IN ('read', 'taken-in', 'discarded')),
        CONSTRAINT intake_revision_if_taken_in CHECK ((state = 'taken-in') = (revision IS NOT NULL))
      );
      CREATE INDEX intake_sheet ON intake (sheet_id, created_at);
      CREATE INDEX intake_same_file ON intake (sheet_id, sha256);
    `)
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE intake')
  }
}
