/** One page of a list, as every paged route answers. */
export interface Page<T> {
  readonly items: readonly T[];
  readonly next: string | null;
}

/** A list read to its end, or as far as a screen can use it. */
export interface WholeList<T> {
  readonly items: readonly T[];
  /** Whether there is more than was read. */
  readonly isCut: boolean;
}

/**
 * Reads page after page until the last one.
 *
 * @param read one page, after the cursor of the page before; `null` for the first
 * @param most items after which no further page is asked for
 */
export async function readAllPages<T>(
  read: (after: string | null) => Promise<Page<T>>,
  most: number,
): Promise<WholeList<T>> {
  const items: T[] = [];
  let after: string | null = null;
  do {
    const page: Page<T> = await read(after);
    items.push(...page.items);
    after = page.next;
  } while (after !== null && items.length < most);
  return { items, isCut: after !== null };
}
