import type * as z from 'zod';
import { badInput, notFound } from './app-error';

/**
 * A body or query as the contract has them, or 400 with one entry a field.
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

/** The parameters of an address: what no address can hold is not there, like what is not shared. */
export function readParameters<Schema extends z.ZodType>(
  schema: Schema,
  parameters: unknown,
): z.output<Schema> {
  const result = schema.safeParse(parameters);
  if (!result.success) throw notFound('address');
  return result.data;
}
