import type * as z from 'zod';
import { badInput } from './app-error';

/**
 * A body, query or parameters as the contract has them, or 400 with one entry a field.
 * The only place that makes a ZodError the caller's fault: one from our own answer is a bug.
 */
export function readRequest<Schema extends z.ZodType>(
  schema: Schema,
  value: unknown,
): z.output<Schema> {
  const result = schema.safeParse(value);
  if (result.success) return result.data;
  const errors = result.error.issues.map((issue) => ({
    path: issue.path.join('.'),
    message: issue.message,
  }));
  throw badInput('Some fields cannot be used as they are.', errors);
}
