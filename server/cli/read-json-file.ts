import { readFile } from 'node:fs/promises';
import type * as z from 'zod';
import { Unusable } from './unusable';
import { whyUnreadable } from './why-unreadable';

/**
 * A JSON file of the command line, checked; with none named what the schema makes of an object without keys.
 *
 * @param what What the file is in a sentence: "The rig".
 */
export async function readJsonFile<T>(
  what: string,
  path: string | undefined,
  schema: z.ZodType<T>,
): Promise<T> {
  if (path === undefined) return schema.parse({});
  let text: string;
  try {
    text = await readFile(path, 'utf8');
  } catch (error) {
    throw whyUnreadable(path, error);
  }
  let json: unknown;
  try {
    json = JSON.parse(text.replace(/^\uFEFF/, ''));
  } catch {
    // A SyntaxError, whose message changes with the version of Node.
    throw new Unusable(`${what} "${path}" is not valid JSON.`);
  }
  const result = schema.safeParse(json);
  if (result.success) return result.data;
  throw new Unusable(`${what} "${path}" ${firstFault(result.error)}.`);
}

function firstFault({ issues }: z.ZodError): string {
  const unknown = issues.find((issue) => issue.code === 'unrecognized_keys');
  if (unknown)
    return `has a key that is not known: ${place([...unknown.path, ...unknown.keys.slice(0, 1)])}`;
  const [issue] = issues;
  if (issue === undefined || issue.path.length === 0) return 'must be an object';
  return `has a value that cannot be used at ${place(issue.path)} (${issue.message})`;
}

/** `mount.gearStages[0].name` */
function place(path: readonly PropertyKey[]): string {
  return path
    .map((key) => (typeof key === 'number' ? `[${key}]` : `.${String(key)}`))
    .join('')
    .replace(/^\./, '');
}
