/** Longest list that a picker still reads whole. */
const MOST = 2_000;

/** Every item of a paged list, for pickers; stops at 2 000. */
export async function allPages<Item>(page: (cursor: string | undefined) => Promise<{ items: Item[]; next: string | null }>): Promise<Item[]> {
  const items: Item[] = [];
  let cursor: string | undefined;
  do {
    const { items: more, next } = await page(cursor);
    items.push(...more);
    cursor = next ?? undefined;
  } while (cursor !== undefined && items.length < MOST);
  return items;
}
