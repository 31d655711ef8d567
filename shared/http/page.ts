import { z } from 'zod';

/** Query of every list: keyset pages, at most 200 rows. */
export const pageQuery = {
  cursor: z.string().max(500, 'Cursor is not one of ours').optional(),
  limit: z.coerce.number().int().min(1, 'Limit must be from 1 to 200').max(200, 'Limit must be from 1 to 200').default(50),
};

/** One page: `next` is the cursor of the following page, null at the end. */
export function pageOf<Item extends z.ZodType>(item: Item) {
  return z.object({ items: z.array(item), next: z.string().nullable() });
}
