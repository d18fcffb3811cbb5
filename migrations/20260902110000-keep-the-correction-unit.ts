import type { Knex } from 'knex';

export async function up(knex: Knex): Promise<void> {
  // null: the log has no corrections, or was read before this was kept; reading it again tells.
  await knex.raw(`
    ALTER TABLE runs ADD COLUMN correction_unit text
      CONSTRAINT runs_correction_unit_known CHECK (correction_unit IN ('ms', 'arcsec'))`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('ALTER TABLE runs DROP COLUMN correction_unit');
}
