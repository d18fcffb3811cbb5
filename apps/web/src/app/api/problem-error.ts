import { HttpErrorResponse } from '@angular/common/http';
import { type Problem, problemSchema } from '@stillpier/contract';

/** A field that was refused: its dotted path in the request and one sentence. */
export interface FieldFault {
  readonly path: string;
  readonly message: string;
}

/** What the server answered instead of what was asked for: an RFC 9457 problem, or no answer at all (status 0). */
export class ProblemError extends Error {
  override readonly name = 'ProblemError';
  readonly kind: string;
  readonly status: number;
  readonly fields: readonly FieldFault[];

  constructor(problem: Problem) {
    super(problem.detail ?? problem.title);
    this.kind = problem.type;
    this.status = problem.status;
    this.fields = problem.errors ?? [];
  }
}

/** Every error of HTTP as a ProblemError, so that pages handle one class. */
export function problemErrorOf(error: unknown): unknown {
  if (!(error instanceof HttpErrorResponse)) return error;
  const problem = problemSchema.safeParse(error.error);
  if (problem.success) return new ProblemError(problem.data);
  return new ProblemError({
    type: error.status === 0 ? 'no-answer' : 'unknown',
    status: error.status,
    title:
      error.status === 0
        ? 'The server did not answer. Check the connection and try again.'
        : `The server could not do this (status ${error.status}). Try again in a minute.`,
  });
}

/** One sentence for people about anything that went wrong. */
export function sentenceOf(error: unknown): string {
  return error instanceof ProblemError
    ? error.message
    : 'The answer could not be read. Load the page again; if it stays so, the server and this page differ in version.';
}
