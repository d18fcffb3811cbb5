import * as z from 'zod';

/** Query of a list that comes in pages: how many, and where the last page ended. */
export const pageQuerySchema = z.strictObject({
  limit: z
    .preprocess(
      (text) => (typeof text === 'string' ? Number(text) : text),
      z.int().min(1).max(1000),
    )
    .default(100),
  cursor: z.string().max(200).optional().describe('`next` of the page before'),
});
export type PageQuery = z.infer<typeof pageQuerySchema>;

/** A page of a list; `next` is the cursor of the following page, or null at the end. */
export const pageOf = <Item extends z.ZodType>(item: Item) =>
  z.strictObject({ items: z.array(item), next: z.string().nullable() });
