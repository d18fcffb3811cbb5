import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  // Whom an import tells is kept with the import: a token may be revoked before its log is read.
  await knex.raw(`
    CREATE TABLE access_tokens (
      id uuid PRIMARY KEY,
      account_id uuid NOT NULL REFERENCES accounts ON DELETE CASCADE,
      name text NOT NULL,
      scope text NOT NULL
        CONSTRAINT access_tokens_scope_known CHECK (scope IN ('upload', 'read')),
      mails text NOT NULL
        CONSTRAINT access_tokens_mails_known CHECK (mails IN ('failed', 'always')),
      token_sha256 bytea NOT NULL CONSTRAINT access_tokens_token_unique UNIQUE,
      expires_at timestamptz(3) NOT NULL,
      last_used_at timestamptz(3),
      created_at timestamptz(3) NOT NULL DEFAULT now());
    CREATE INDEX access_tokens_of_account ON access_tokens (account_id, created_at);

    ALTER TABLE imports
      ADD COLUMN mail_to uuid REFERENCES accounts ON DELETE SET NULL,
      ADD COLUMN mails text
        CONSTRAINT imports_mails_known CHECK (mails IN ('failed', 'always'))`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    ALTER TABLE imports DROP COLUMN mails, DROP COLUMN mail_to;
    DROP TABLE access_tokens`);
}
