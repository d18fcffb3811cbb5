import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE runs (
      id uuid PRIMARY KEY,
      rig_id uuid NOT NULL REFERENCES rigs ON DELETE CASCADE,
      import_id uuid NOT NULL REFERENCES imports ON DELETE CASCADE,
      setup_id uuid REFERENCES setups ON DELETE SET NULL,
      night date NOT NULL,
      run_index integer NOT NULL,
      target text,
      starts_at timestamptz NOT NULL,
      duration_seconds double precision NOT NULL,
      frames integer NOT NULL,
      used integer NOT NULL,
      ra_rms_arcsec double precision,
      dec_rms_arcsec double precision,
      total_rms_arcsec double precision,
      aspect double precision,
      position_angle_degrees double precision,
      subs integer,
      subs_within integer,
      seeing_fwhm_arcsec double precision,
      optics jsonb NOT NULL,
      run jsonb NOT NULL,
      spectrum jsonb,
      CONSTRAINT runs_index_once UNIQUE (import_id, run_index));
    CREATE INDEX runs_of_night ON runs (rig_id, night, starts_at);

    CREATE TABLE run_series (
      run_id uuid NOT NULL REFERENCES runs ON DELETE CASCADE,
      channel text NOT NULL,
      samples bytea NOT NULL,
      CONSTRAINT run_series_once PRIMARY KEY (run_id, channel));
    -- Packed floats do not shrink: out of line and as they are, so that a stretch is read without the rest.
    ALTER TABLE run_series ALTER COLUMN samples SET STORAGE EXTERNAL;

    CREATE TABLE nights (
      rig_id uuid NOT NULL REFERENCES rigs ON DELETE CASCADE,
      date date NOT NULL,
      starts_at timestamptz NOT NULL,
      ends_at timestamptz NOT NULL,
      targets jsonb NOT NULL,
      run_count integer NOT NULL,
      guided_hours double precision NOT NULL,
      frames integer NOT NULL,
      used integer NOT NULL,
      ra_rms_arcsec double precision,
      dec_rms_arcsec double precision,
      total_rms_arcsec double precision,
      aspect double precision,
      position_angle_degrees double precision,
      kept_share double precision,
      main_limit_code text,
      main_limit_severity text,
      CONSTRAINT nights_once PRIMARY KEY (rig_id, date))`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE nights, run_series, runs');
}
