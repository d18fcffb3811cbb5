import * as z from 'zod';

/** RFC 9457 problem details, with the fields that were refused. */
export const problemSchema = z
  .object({
    type: z.string().describe('A stable name of the kind of problem, as in "not-found"'),
    title: z.string(),
    status: z.int(),
    detail: z.string().optional(),
    errors: z
      .array(z.object({ path: z.string(), message: z.string() }))
      .optional()
      .describe('One entry a refused field; path is dotted'),
  })
  .meta({ id: 'Problem' });
export type Problem = z.infer<typeof problemSchema>;
