import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE accounts (
      id uuid PRIMARY KEY,
      email text NOT NULL CONSTRAINT accounts_email_unique UNIQUE
        CONSTRAINT accounts_email_lower_case CHECK (email = lower(email)),
      name text NOT NULL,
      kind text NOT NULL CONSTRAINT accounts_kind_known CHECK (kind IN ('member', 'steward')),
      password_hash text NOT NULL,
      created_at timestamptz NOT NULL DEFAULT now()
    );

    -- An account exists from its confirmation on. Several sign-ups may wait for one address: each
    -- link confirms the name and password that were typed with it, and nobody else's.
    CREATE TABLE sign_ups (
      id uuid PRIMARY KEY,
      email text NOT NULL CONSTRAINT sign_ups_email_lower_case CHECK (email = lower(email)),
      name text NOT NULL,
      password_hash text NOT NULL,
      token_sha256 bytea CONSTRAINT sign_ups_token_unique UNIQUE,
      expires_at timestamptz NOT NULL,
      created_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX sign_ups_email ON sign_ups (email);
    CREATE INDEX sign_ups_expires_at ON sign_ups (expires_at);

    CREATE TABLE password_resets (
      token_sha256 bytea PRIMARY KEY,
      account_id uuid NOT NULL REFERENCES accounts ON DELETE CASCADE,
      expires_at timestamptz NOT NULL
    );
    CREATE INDEX password_resets_account_id ON password_resets (account_id);

    -- sid, sess and expire are what connect-pg-simple writes. The account is read out of the
    -- session, so that it can be joined, and so that sessions go with their account.
    CREATE TABLE sessions (
      sid text PRIMARY KEY,
      sess json NOT NULL,
      expire timestamptz NOT NULL,
      account_id uuid GENERATED ALWAYS AS ((sess -> 'passport' ->> 'user')::uuid) STORED
        REFERENCES accounts ON DELETE CASCADE
    );
    CREATE INDEX sessions_expire ON sessions (expire);
    CREATE INDEX sessions_account_id ON sessions (account_id);

    -- The columns that rate-limiter-flexible expects.
    CREATE TABLE rate_limits (
      key text PRIMARY KEY,
      points integer NOT NULL DEFAULT 0,
      expire bigint
    );
    CREATE INDEX rate_limits_expire ON rate_limits (expire)`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE rate_limits, sessions, password_resets, sign_ups, accounts');
}
