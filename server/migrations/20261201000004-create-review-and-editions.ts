import type { MigrationInterface, QueryRunner } from 'typeorm'

export class CreateReviewAndEditions20261201000004 implements MigrationInterface {
  readonly name = 'CreateReviewAndEditions20261201000004'

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      CREATE TABLE submission (
        id uuid CONSTRAINT submission_pkey PRIMARY KEY DEFAULT gen_random_uuid(),
        sheet_id uuid NOT NULL CONSTRAINT submission_sheet_fkey REFERENCES sheet (id),
        revision integer NOT NULL,
        since integer NOT NULL,
        digest text NOT NULL,
        contents jsonb NOT NULL,
        differences jsonb NOT NULL,
        submitted_by uuid NOT NULL CONSTRAINT submission_submitted_by_fkey REFERENCES account (id),
        at timestamptz NOT NULL DEFAULT now(),
        message text NOT NULL,
        decision text,
        decided_by uuid CONSTRAINT submission_decided_by_fkey REFERENCES account (id),
        decided_at timestamptz,
        note text NOT NULL DEFAULT '',
        job_id uuid,
        CONSTRAINT submission_decision_known CHECK (decision IN ('approved', 'returned')),
        CONSTRAINT submission_decided_whole
          CHECK ((decision IS NULL) = (decided_by IS NULL) AND (decision IS NULL) = (decided_at IS NULL)),
        CONSTRAINT submission_two_people CHECK (decided_by <> submitted_by)
      );
      CREATE UNIQUE INDEX submission_open ON submission (sheet_id) WHERE decision IS NULL;
      CREATE INDEX submission_latest ON submission (sheet_id, at);

      CREATE TABLE edition (
        id uuid CONSTRAINT edition_pkey PRIMARY KEY DEFAULT gen_random_uuid(),
        sheet_id uuid NOT NULL CONSTRAINT edition_sheet_fkey REFERENCES sheet (id),
        number integer NOT NULL,
        submission_id uuid NOT NULL CONSTRAINT edition_submission_fkey REFERENCES submission (id),
        revision integer NOT NULL,
        digest text NOT NULL,
        title text NOT NULL,
        authors text NOT NULL,
        scale integer NOT NULL,
        srid integer NOT NULL,
        crs_name text NOT NULL,
        footprint jsonb NOT NULL,
        citation text NOT NULL,
        caution text NOT NULL,
        released_at timestamptz NOT NULL,
        approved_by uuid NOT NULL CONSTRAINT edition_approved_by_fkey REFERENCES account (id),
        state text NOT NULL DEFAULT 'current',
        CONSTRAINT edition_state_known CHECK (state IN ('current', 'superseded', 'withdrawn'))
      );
      CREATE UNIQUE INDEX edition_number_unique ON edition (sheet_id, number);
      CREATE UNIQUE INDEX edition_submission_unique ON edition (submission_id);
      CREATE UNIQUE INDEX edition_current ON edition (sheet_id) WHERE state = 'current';

      CREATE TABLE artefact (
        edition_id uuid NOT NULL CONSTRAINT artefact_edition_fkey REFERENCES edition (id),
        name text NOT NULL,
        place integer NOT NULL,
        title text NOT NULL,
        media_type text NOT NULL,
        bytes bigint NOT NULL,
        sha256 text NOT NULL,
        storage_key text NOT NULL,
        CONSTRAINT artefact_pkey PRIMARY KEY (edition_id, name)
      );
    `)
    await seal(runner)
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`
      DROP TABLE artefact;
      DROP TABLE edition;
      DROP TABLE submission;
      DROP FUNCTION keep_edition_sealed();
      DROP FUNCTION keep_artefact_sealed();
      DROP FUNCTION keep_decision();
    `)
  }
}

/** What is released stays as it is, whoever writes to the database: only an edition's state goes on, and artefacts come
 *  only in the transaction that makes their edition. A decision, once made, stands. */
async function seal(runner: QueryRunner): Promise<void> {
  await runner.query(`
    CREATE FUNCTION keep_edition_sealed() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      IF TG_OP = 'UPDATE' AND OLD.state = 'current' AND NEW.state IN ('superseded', 'withdrawn')
        AND to_jsonb(NEW) - 'state' = to_jsonb(OLD) - 'state' THEN
        RETURN NEW;
      END IF;
      RAISE EXCEPTION 'A released edition is never altered or deleted.' USING ERRCODE = 'restrict_violation';
    END $$;
    CREATE TRIGGER edition_sealed BEFORE UPDATE OR DELETE ON edition
      FOR EACH ROW EXECUTE FUNCTION keep_edition_sealed();
    CREATE TRIGGER edition_not_emptied BEFORE TRUNCATE ON edition
      FOR EACH STATEMENT EXECUTE FUNCTION keep_edition_sealed();

    CREATE FUNCTION keep_artefact_sealed() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      IF TG_OP = 'INSERT' AND EXISTS (
        SELECT FROM edition WHERE id = NEW.edition_id AND xmin = pg_current_xact_id()::xid
      ) THEN
        RETURN NEW;
      END IF;
      RAISE EXCEPTION 'The files of a released edition are never altered, added to or deleted.'
        USING ERRCODE = 'restrict_violation';
    END $$;
    CREATE TRIGGER artefact_sealed BEFORE INSERT OR UPDATE OR DELETE ON artefact
      FOR EACH ROW EXECUTE FUNCTION keep_artefact_sealed();
    CREATE TRIGGER artefact_not_emptied BEFORE TRUNCATE ON artefact
      FOR EACH STATEMENT EXECUTE FUNCTION keep_artefact_sealed();

    CREATE FUNCTION keep_decision() RETURNS trigger LANGUAGE plpgsql AS $$
    BEGIN
      IF OLD.decision IS NULL AND to_jsonb(NEW) - '{decision,decided_by,decided_at,note}'::text[]
          = to_jsonb(OLD) - '{decision,decided_by,decided_at,note}'::text[]
        OR to_jsonb(NEW) - 'job_id' = to_jsonb(OLD) - 'job_id' THEN
        RETURN NEW;
      END IF;
      RAISE EXCEPTION 'A submission and its decision stand as they were made.' USING ERRCODE = 'restrict_violation';
    END $$;
    CREATE TRIGGER submission_stands BEFORE UPDATE ON submission
      FOR EACH ROW EXECUTE FUNCTION keep_decision();
  `)
}
