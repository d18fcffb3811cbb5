import * as z from 'zod';

export const BY_HAND_ACTIONS = ['set aside', 'take back'] as const;

const stretchFields = {
  fromSeconds: z.number().min(0).describe('In the run, included'),
  toSeconds: z.number().positive().describe('In the run, not included'),
};
const reasonSchema = z.string().trim().min(1, 'needs a reason').max(300);

/** A stretch of a run is set aside, or what was set aside in it is taken back. */
export const changeByHandSchema = z
  .strictObject({ ...stretchFields, action: z.enum(BY_HAND_ACTIONS), reason: reasonSchema })
  .refine(({ fromSeconds, toSeconds }) => fromSeconds < toSeconds, {
    path: ['toSeconds'],
    error: 'needs to be later than fromSeconds',
  });
export type ChangeByHand = z.infer<typeof changeByHandSchema>;

/** What people set aside of a run, and how that came about. The figures follow when the import is done again. */
export const byHandSchema = z
  .strictObject({
    importId: z.uuid().describe('The log of the run: its state says whether the figures follow'),
    stretches: z.array(z.strictObject(stretchFields)).describe('Set aside now, in order of time'),
    history: z
      .array(
        z.strictObject({
          ...stretchFields,
          id: z.uuid(),
          action: z.enum(BY_HAND_ACTIONS),
          reason: reasonSchema,
          by: z.string().nullable().describe('Name; null when the account is gone'),
          at: z.iso.datetime(),
        }),
      )
      .describe('Newest first'),
  })
  .meta({ id: 'ByHand' });
export type ByHand = z.infer<typeof byHandSchema>;

export const byHandPaths = {
  /** GET: 200 ByHand; POST changeByHandSchema: 202 ByHand, with the import in Location. */
  of: (rigId: string, runId: string) => `/api/v1/rigs/${rigId}/runs/${runId}/by-hand`,
} as const;
