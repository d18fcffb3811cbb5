import type { PostgresPrograms } from './postgres-programs.mjs';

export interface Cluster {
  readonly url: string;
  readonly urlOf: (database: string) => string;
  readonly psql: (sql: string) => string;
  readonly stop: () => void;
}

export function startThrowawayCluster(
  programs: PostgresPrograms,
  localFolder: string,
): Promise<Cluster>;
