import path from 'node:path';
import type { TestProject } from 'vitest/node';
import { migrateDatabase } from '../../server/database/migrate-database';
import { startThrowawayCluster } from '../../server/local/cluster.mjs';
import { ensurePostgres } from '../../server/local/postgres-programs.mjs';

declare module 'vitest' {
  export interface ProvidedContext {
    /** Address of the throw-away cluster, with DATABASE in the place of a name. */
    databaseUrlPattern: string;
  }
}

/** One throw-away cluster a run, with a migrated template that each test file clones. */
export default async function setUp(project: TestProject): Promise<() => void> {
  const cluster = await startThrowawayCluster(ensurePostgres(), path.resolve('.local'));
  process.once('exit', cluster.stop); // also when the run is interrupted
  cluster.psql('CREATE DATABASE template_stillpier OWNER stillpier');
  await migrateDatabase(cluster.urlOf('template_stillpier'));
  project.provide('databaseUrlPattern', cluster.urlOf('DATABASE'));
  return cluster.stop;
}
