/**
 * US Letter in points. The gutter left of the text is a notebook's margin: the mark of each step's outcome stands in it,
 * so that a page can be read down its edge.
 */
export const PAGE = {
  width: 612,
  height: 792,
  left: 78,
  right: 558,
  top: 62,
  bottom: 726,
  marginRule: 66,
  markX: 54,
  footer: 756,
  runningHead: 38,
} as const;

/** Width of the text between the margins, in points. */
export const TEXT_WIDTH = PAGE.right - PAGE.left;
