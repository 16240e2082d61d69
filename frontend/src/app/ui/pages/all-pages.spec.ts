import { describe, expect, it } from '@jest/globals';
import { readAllPages, type Page } from './all-pages';

const PAGES: Readonly<Record<string, Page<number>>> = {
  first: { items: [1, 2], next: 'b' },
  b: { items: [3, 4], next: 'c' },
  c: { items: [5], next: null },
};
const read = async (after: string | null): Promise<Page<number>> =>
  PAGES[after ?? 'first'] ?? { items: [], next: null };

describe('readAllPages', () => {
  it('follows the cursor to the last page', async () => {
    expect(await readAllPages(read, 100)).toEqual({ items: [1, 2, 3, 4, 5], isCut: false });
  });

  it('stops where a screen has enough, and says so', async () => {
    expect(await readAllPages(read, 3)).toEqual({ items: [1, 2, 3, 4], isCut: true });
  });

  it('hands on what a page fails with', async () => {
    await expect(readAllPages(() => Promise.reject(new TypeError('gone')), 10)).rejects.toThrow('gone');
  });
});
