import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  // The name and hash of an upload are known when its last byte is in: the chunks come first, hence DEFERRED.
  await knex.raw(`
    CREATE TABLE imports (
      id uuid PRIMARY KEY,
      rig_id uuid NOT NULL REFERENCES rigs ON DELETE CASCADE,
      setup_id uuid REFERENCES setups ON DELETE SET NULL,
      uploaded_by uuid REFERENCES accounts ON DELETE SET NULL,
      file_name text NOT NULL,
      size_bytes bigint NOT NULL,
      sha256 text NOT NULL,
      map jsonb,
      state text NOT NULL
        CONSTRAINT imports_state_known CHECK (state IN ('waiting', 'running', 'done', 'failed')),
      progress double precision NOT NULL DEFAULT 0,
      stage text NOT NULL,
      error text,
      job_id bigint,
      attempt integer NOT NULL DEFAULT 0,
      line_count integer,
      frame_count integer,
      refused_count integer,
      document jsonb,
      analysis_version text,
      created_at timestamptz(3) NOT NULL DEFAULT now(),
      CONSTRAINT imports_failed_says_why CHECK ((state = 'failed') = (error IS NOT NULL)),
      CONSTRAINT imports_file_once UNIQUE (rig_id, sha256));
    CREATE INDEX imports_of_rig ON imports (rig_id, created_at DESC);
    CREATE INDEX imports_unfinished ON imports (job_id) WHERE state IN ('waiting', 'running');

    CREATE TABLE import_chunks (
      import_id uuid NOT NULL
        CONSTRAINT import_chunks_of_import REFERENCES imports ON DELETE CASCADE
        DEFERRABLE INITIALLY DEFERRED,
      position integer NOT NULL,
      bytes bytea NOT NULL,
      CONSTRAINT import_chunks_once PRIMARY KEY (import_id, position))`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE import_chunks, imports');
}
