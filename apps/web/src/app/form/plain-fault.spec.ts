import * as z from 'zod';
import { plainFault } from './plain-fault';

const faultOf = (schema: z.ZodType, input: unknown) =>
  schema.safeParse(input, { error: plainFault }).error?.issues[0]?.message;

describe('what zod found, in plain words', () => {
  it.each([
    ['an empty number', z.number(), null, 'is needed'],
    ['a wrong type', z.number(), 'x', 'needs a number'],
    ['a broken number', z.int(), 1.5, 'needs a whole number'],
    ['a small number', z.number().min(10), 9, 'needs at least 10'],
    ['a number that must be above', z.number().positive(), 0, 'needs more than 0'],
    ['a large number', z.number().max(8), 9, 'needs at most 8'],
    ['an empty text', z.string().min(1), '', 'is needed'],
    ['a short text', z.string().min(10), 'x', 'needs at least 10 characters'],
    ['a long list', z.array(z.int()).max(1), [1, 2], 'needs at most 1 entries'],
    ['none of the choices', z.enum(['a']), 'b', 'needs one of the choices'],
    ['anything else', z.uuid(), 'b', 'needs another value'],
  ])('names %s', (_case, schema, input, sentence) => {
    expect(faultOf(schema, input)).toBe(sentence);
  });

  it("leaves a schema's own words alone", () => {
    expect(faultOf(z.string().min(1, 'needs a name'), '')).toBe('needs a name');
  });
});
