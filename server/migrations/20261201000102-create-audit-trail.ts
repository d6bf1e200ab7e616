import type { MigrationInterface, QueryRunner } from 'typeorm'

export class CreateAuditTrail20261201000102 implements MigrationInterface {
  readonly name = 'CreateAuditTrail20261201000102'

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      CREATE TABLE audit_entry (
        number integer CONSTRAINT audit_entry_pkey PRIMARY KEY,
        at timestamptz NOT NULL,
        kind text NOT NULL,
        account_id uuid,
        sheet text,
        detail jsonb NOT NULL,
        previous text NOT NULL,
        hash text NOT NULL,
        CONSTRAINT audit_entry_number_positive CHECK (number > 0)
      );
      CREATE INDEX audit_entry_kind ON audit_entry (kind, number);
      CREATE INDEX audit_entry_account ON audit_entry (account_id, number);
      CREATE INDEX audit_entry_sheet ON audit_entry (sheet, number);

      CREATE TABLE audit_head (
        one boolean CONSTRAINT audit_head_pkey PRIMARY KEY,
        number integer NOT NULL,
        hash text NOT NULL,
        CONSTRAINT audit_head_one_row CHECK (one)
      );
      INSERT INTO audit_head (one, number, hash) VALUES (true, 0, repeat('0', 64));

      -- Rights keep the application from it; this keeps its owner from doing it by mistake.
      CREATE FUNCTION keep_audit_trail() RETURNS trigger LANGUAGE plpgsql AS $$
      BEGIN
        RAISE EXCEPTION 'The audit trail is only ever added to.' USING ERRCODE = 'restrict_violation';
      END $$;
      CREATE TRIGGER audit_entry_kept BEFORE UPDATE OR DELETE ON audit_entry
        FOR EACH ROW EXECUTE FUNCTION keep_audit_trail();
      CREATE TRIGGER audit_entry_not_emptied BEFORE TRUNCATE ON audit_entry
        FOR EACH STATEMENT EXECUTE FUNCTION keep_audit_trail();
    `)
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('DROP TABLE audit_entry; DROP TABLE audit_head; DROP FUNCTION keep_audit_trail();')
  }
}
