import type { MigrationInterface, QueryRunner } from 'typeorm'

export class CreateAccounts20261201000001 implements MigrationInterface {
  readonly name = 'CreateAccounts20261201000001'

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      CREATE EXTENSION IF NOT EXISTS postgis;

      CREATE TABLE account (
        id uuid CONSTRAINT account_pkey PRIMARY KEY DEFAULT gen_random_uuid(),
        email text NOT NULL,
        name text NOT NULL,
        initials text NOT NULL,
        administrator boolean NOT NULL DEFAULT false,
        demo boolean NOT NULL DEFAULT false,
        password_hash text,
        created_at timestamptz NOT NULL DEFAULT now(),
        CONSTRAINT account_email_lower_case CHECK (email = lower(email))
      );
      CREATE UNIQUE INDEX account_email_unique ON account (email);

      CREATE TABLE membership (
        account_id uuid NOT NULL CONSTRAINT membership_account_fkey REFERENCES account (id),
        sheet_id uuid NOT NULL,
        role text NOT NULL,
        CONSTRAINT membership_pkey PRIMARY KEY (account_id, sheet_id, role),
        CONSTRAINT membership_role_known CHECK (role IN ('compiler', 'editor', 'approver'))
      );
      CREATE INDEX membership_sheet ON membership (sheet_id);

      CREATE TABLE link (
        id uuid CONSTRAINT link_pkey PRIMARY KEY DEFAULT gen_random_uuid(),
        token_hash text NOT NULL,
        purpose text NOT NULL,
        account_id uuid CONSTRAINT link_account_fkey REFERENCES account (id),
        expires_at timestamptz NOT NULL,
        used_at timestamptz,
        created_at timestamptz NOT NULL DEFAULT now(),
        CONSTRAINT link_purpose_known CHECK (purpose IN ('first-administrator', 'invitation')),
        CONSTRAINT link_invitation_names_account CHECK ((purpose = 'invitation') = (account_id IS NOT NULL))
      );
      CREATE UNIQUE INDEX link_token_hash_unique ON link (token_hash);

      CREATE TABLE session (
        sid text CONSTRAINT session_pkey PRIMARY KEY,
        sess jsonb NOT NULL,
        expire timestamptz NOT NULL
      );
      CREATE INDEX session_expire ON session (expire);

      CREATE TABLE job (
        id uuid CONSTRAINT job_pkey PRIMARY KEY DEFAULT gen_random_uuid(),
        kind text NOT NULL,
        sheet text NOT NULL,
        data jsonb NOT NULL,
        state text NOT NULL DEFAULT 'waiting',
        progress double precision NOT NULL DEFAULT 0,
        message text NOT NULL DEFAULT '',
        created_at timestamptz NOT NULL DEFAULT now(),
        changed_at timestamptz NOT NULL DEFAULT now(),
        CONSTRAINT job_state_known CHECK (state IN ('waiting', 'running', 'done', 'failed')),
        CONSTRAINT job_progress_range CHECK (progress BETWEEN 0 AND 1)
      );
      CREATE INDEX job_open ON job (kind) WHERE state IN ('waiting', 'running');
    `)
  }

  async down(runner: QueryRunner): Promise<void> {
    // The extension stays: other schemas of the same database may use it.
    await runner.query(
      'DROP TABLE job; DROP TABLE session; DROP TABLE link; DROP TABLE membership; DROP TABLE account;',
    )
  }
}
