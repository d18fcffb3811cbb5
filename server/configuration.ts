import * as z from 'zod';

const environmentSchema = z.object({
  DATABASE_URL: z.url({ protocol: /^postgres(ql)?$/, error: 'needs a postgres:// address' }),
  SMTP_URL: z.url({ protocol: /^smtps?$/, error: 'needs an smtp:// or smtps:// address' }),
  PUBLIC_URL: z
    .url({ protocol: /^https?$/, error: 'needs the http(s):// address that people open' })
    .transform((url) => url.replace(/\/+$/, '')),
  SESSION_SECRET: z.string('needs a text of at least 32 characters').min(32),
  PORT: z.coerce.number().int().min(0).max(65_535).default(3000),
  HOST: z.string().default('127.0.0.1'),
  /** How many reverse proxies stand in front: their X-Forwarded-* headers are believed. */
  TRUST_PROXY: z.coerce.number().int().min(0).default(0),
  /** The largest guide log that is taken. */
  UPLOAD_LIMIT_MIB: z.coerce.number().int().min(1).default(200),
  /** The most that a compressed guide log may unpack to. */
  UNPACKED_LIMIT_MIB: z.coerce.number().int().min(1).default(800),
  /** The most lines that a guide log may have. */
  LINE_LIMIT: z.coerce.number().int().min(1).default(2_000_000),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent']).default('info'),
  NODE_ENV: z.enum(['development', 'test', 'production']).default('development'),
  /** Sender of the e-mails; made from PUBLIC_URL when it is missing. */
  MAIL_FROM: z.string().min(3).optional(),
  /** Where the local mail catcher shows its mails: told to who waits for one. */
  LOCAL_MAIL_URL: z.url().optional(),
});

/** What the environment says, checked once at the start of each process. */
export type Configuration = z.output<typeof environmentSchema>;

export class ConfigurationError extends Error {}

export function readConfiguration(environment: NodeJS.ProcessEnv): Configuration {
  const result = environmentSchema.safeParse(environment);
  if (result.success) return result.data;
  const faults = result.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`);
  throw new ConfigurationError(`The environment is not complete. ${faults.join('; ')}.`);
}

/** The environment of this process; one that is not complete ends it with one sentence. */
export function configurationOrExit(): Configuration {
  try {
    return readConfiguration(process.env);
  } catch (error) {
    // Whoever started the process can mend this, and a stack would only hide the sentence.
    if (!(error instanceof ConfigurationError)) throw error;
    console.error(error.message);
    process.exit(1);
  }
}
