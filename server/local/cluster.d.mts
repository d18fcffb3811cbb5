import type { PostgresPrograms } from './postgres-programs.mjs';

export interface Cluster {
  readonly url: string;
  readonly urlOf: (database: string) => string;
  readonly psql: (sql: string) => string;
  readonly stop: () => void;
}

export function startCluster(options: {
  readonly base: string;
  readonly programs: PostgresPrograms;
  readonly throwaway?: boolean;
}): Promise<Cluster>;

export function startThrowawayCluster(
  programs: PostgresPrograms,
  localFolder: string,
): Promise<Cluster>;
