import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE rigs (
      id uuid PRIMARY KEY,
      name text NOT NULL,
      mount jsonb NOT NULL,
      site jsonb NOT NULL,
      version integer NOT NULL DEFAULT 1,
      created_at timestamptz(3) NOT NULL DEFAULT now());

    CREATE TABLE rig_members (
      rig_id uuid NOT NULL REFERENCES rigs ON DELETE CASCADE,
      account_id uuid NOT NULL REFERENCES accounts ON DELETE CASCADE,
      role text NOT NULL
        CONSTRAINT rig_members_role_known CHECK (role IN ('owner', 'operator', 'advisor')),
      created_at timestamptz(3) NOT NULL DEFAULT now(),
      CONSTRAINT rig_members_once PRIMARY KEY (rig_id, account_id));
    CREATE INDEX rig_members_account ON rig_members (account_id);

    CREATE TABLE setups (
      id uuid PRIMARY KEY,
      rig_id uuid NOT NULL REFERENCES rigs ON DELETE CASCADE,
      name text NOT NULL,
      imaging jsonb NOT NULL,
      filters jsonb NOT NULL,
      guiding jsonb NOT NULL,
      seeing_fwhm_arcsec double precision,
      sub_seconds double precision NOT NULL,
      keep_aspect double precision NOT NULL,
      version integer NOT NULL DEFAULT 1,
      created_at timestamptz(3) NOT NULL DEFAULT now());
    CREATE INDEX setups_of_rig ON setups (rig_id, created_at);

    CREATE TABLE column_maps (
      id uuid PRIMARY KEY,
      rig_id uuid NOT NULL REFERENCES rigs ON DELETE CASCADE,
      name text NOT NULL,
      header_cells jsonb NOT NULL,
      map jsonb NOT NULL,
      created_at timestamptz(3) NOT NULL DEFAULT now());
    CREATE INDEX column_maps_of_rig ON column_maps (rig_id, created_at)`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE column_maps, setups, rig_members, rigs');
}
