import type * as z from 'zod';

/** What zod found, in words that fit under a field. A schema's own message wins over it. */
export function plainFault(issue: z.core.$ZodRawIssue): string {
  if (issue.code === 'invalid_type') {
    if (issue.input === null || issue.input === undefined) return 'is needed';
    return issue.expected === 'int' ? 'needs a whole number' : `needs a ${issue.expected}`;
  }
  if (issue.code === 'too_small') {
    if (issue.origin === 'string' && issue.minimum === 1) return 'is needed';
    const words = issue.inclusive === false ? 'more than' : 'at least';
    return `needs ${words} ${issue.minimum}${countedIn(issue.origin)}`;
  }
  if (issue.code === 'too_big') {
    const words = issue.inclusive === false ? 'less than' : 'at most';
    return `needs ${words} ${issue.maximum}${countedIn(issue.origin)}`;
  }
  return issue.code === 'invalid_value' ? 'needs one of the choices' : 'needs another value';
}

function countedIn(origin: string): string {
  if (origin === 'string') return ' characters';
  return origin === 'array' ? ' entries' : '';
}
