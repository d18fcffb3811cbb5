import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  // Seconds of the log and not of the run: they hold when another map cuts the log into other runs.
  await knex.raw(`
    CREATE TABLE by_hand_entries (
      id uuid PRIMARY KEY,
      import_id uuid NOT NULL REFERENCES imports ON DELETE CASCADE,
      action text NOT NULL
        CONSTRAINT by_hand_entries_action_known CHECK (action IN ('set aside', 'take back')),
      from_log_seconds double precision NOT NULL,
      to_log_seconds double precision NOT NULL,
      reason text NOT NULL,
      made_by uuid REFERENCES accounts ON DELETE SET NULL,
      position bigint GENERATED ALWAYS AS IDENTITY,
      created_at timestamptz(3) NOT NULL DEFAULT now(),
      CONSTRAINT by_hand_entries_forward CHECK (from_log_seconds < to_log_seconds));
    CREATE INDEX by_hand_entries_of_import ON by_hand_entries (import_id, position);

    ALTER TABLE runs ADD COLUMN log_offset_seconds double precision;
    UPDATE runs SET log_offset_seconds = extract(epoch FROM runs.starts_at - logs.starts_at)
      FROM (SELECT import_id, min(starts_at) AS starts_at FROM runs GROUP BY import_id) logs
     WHERE logs.import_id = runs.import_id;
    ALTER TABLE runs ALTER COLUMN log_offset_seconds SET NOT NULL`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    ALTER TABLE runs DROP COLUMN log_offset_seconds;
    DROP TABLE by_hand_entries`);
}
