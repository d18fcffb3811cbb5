export interface PostgresPrograms {
  readonly folder: string;
  readonly major: number;
}

export function ensurePostgres(): PostgresPrograms;
