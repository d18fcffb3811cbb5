import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    ALTER TABLE column_maps
      ALTER COLUMN rig_id DROP NOT NULL,
      ALTER COLUMN header_cells DROP NOT NULL,
      ADD COLUMN account_id uuid REFERENCES accounts ON DELETE CASCADE,
      ADD CONSTRAINT column_maps_one_owner CHECK (num_nonnulls(rig_id, account_id) = 1);
    CREATE INDEX column_maps_of_account ON column_maps (account_id, created_at)`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    DELETE FROM column_maps WHERE rig_id IS NULL OR header_cells IS NULL;
    ALTER TABLE column_maps
      DROP COLUMN account_id,
      ALTER COLUMN header_cells SET NOT NULL,
      ALTER COLUMN rig_id SET NOT NULL`);
}
