import type { Sheet } from './sheet';

/** A piece of a page that is never cut. Longer things (a note, a table) are rows of blocks. */
export interface Block {
  /** In points. */
  readonly height: number;
  /** Whether it must stand on the same page as the block after it: headings, captions, a note's first line. */
  readonly keepWithNext?: boolean;
  /** White space only: dropped at the top of a page. */
  readonly isGap?: boolean;
  /** Drawn again on top of the page when a page break falls right before this block: a table's head. */
  readonly repeated?: Block;
  /** What has to be fetched before it can be drawn; its height must be known without it. */
  readonly prepare?: () => Promise<void>;
  readonly draw: (sheet: Sheet, top: number) => void;
}

/** White space between blocks. */
export const gap = (height: number): Block => ({ height, isGap: true, draw: () => undefined });

/** The same blocks, each tied to its neighbour, so that they stay on one page where they fit on one. */
export function kept(blocks: readonly Block[], alsoToNext = false): Block[] {
  return blocks.map((block, index) =>
    index < blocks.length - 1 || alsoToNext ? { ...block, keepWithNext: true } : block,
  );
}
