import type { PostgresPrograms } from './postgres-programs.mjs';

export interface Cluster {
  readonly url: string;
  urlOf(database: string): string;
  psql(sql: string): string;
  stop(): void;
}

export function startThrowawayCluster(
  programs: PostgresPrograms,
  localFolder: string,
): Promise<Cluster>;
