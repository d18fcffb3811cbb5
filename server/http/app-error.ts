import { STATUS_CODES } from 'node:http';
import type { Problem } from '@stillpier/contract';

export type FieldError = NonNullable<Problem['errors']>[number];

interface Extras {
  readonly errors?: readonly FieldError[];
  readonly headers?: Readonly<Record<string, string>>;
}

/** A refusal that the caller is told about: a status, a stable name and one plain sentence. */
export class AppError extends Error {
  constructor(
    readonly status: number,
    readonly type: string,
    readonly detail: string,
    readonly extras: Extras = {},
  ) {
    super(detail);
  }

  toProblem(): Problem {
    const title = STATUS_CODES[this.status] ?? 'Error';
    const problem: Problem = { type: this.type, title, status: this.status, detail: this.detail };
    return this.extras.errors ? { ...problem, errors: [...this.extras.errors] } : problem;
  }
}

export function badInput(detail: string, errors?: readonly FieldError[]): AppError {
  return new AppError(400, 'bad-input', detail, errors ? { errors } : {});
}

export function unauthenticated(): AppError {
  return new AppError(401, 'signed-out', 'Sign in first.');
}

export function forbidden(detail: string): AppError {
  return new AppError(403, 'forbidden', detail);
}

/** Also for what exists and is not the caller's: the answer must not tell the two apart. */
export function notFound(what: string): AppError {
  return new AppError(404, 'not-found', `There is no such ${what}, or it is not shared with you.`);
}

export function conflict(type: string, detail: string): AppError {
  return new AppError(409, type, detail);
}

export function staleVersion(): AppError {
  return new AppError(
    412,
    'stale-version',
    'Somebody else changed this in the meantime: load it again.',
  );
}

export function tooLarge(detail: string): AppError {
  // The rest of the body will not be read.
  return new AppError(413, 'too-large', detail, { headers: { Connection: 'close' } });
}

export function unprocessable(type: string, detail: string): AppError {
  return new AppError(422, type, detail);
}

export function tooManyRequests(retryAfterSeconds: number): AppError {
  const detail = `Too many tries: the next one may come in ${retryAfterSeconds} s.`;
  const headers = { 'Retry-After': String(retryAfterSeconds) };
  return new AppError(429, 'too-many-requests', detail, { headers });
}
