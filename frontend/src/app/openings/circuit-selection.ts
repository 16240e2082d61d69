/** What is selected in a table, and the row that a range with Shift starts from. */
export interface Selection {
  readonly ids: ReadonlySet<string>;
  readonly anchor: string | null;
}

export const NOTHING_SELECTED: Selection = { ids: new Set(), anchor: null };

/**
 * Selects or frees one row; with `isRange` all rows between the anchor and this one become what this one becomes.
 *
 * @param shown the rows' ids in the order on the screen: a range never reaches rows that a filter hides
 */
export function toggle(
  selection: Selection,
  shown: readonly string[],
  id: string,
  isRange: boolean,
): Selection {
  const ids = new Set(selection.ids);
  const isOn = !ids.has(id);
  const from = isRange && selection.anchor !== null ? shown.indexOf(selection.anchor) : -1;
  const to = shown.indexOf(id);
  const touched = from === -1 || to === -1 ? [id] : shown.slice(Math.min(from, to), Math.max(from, to) + 1);
  for (const each of touched) {
    if (isOn) ids.add(each);
    else ids.delete(each);
  }
  return { ids, anchor: id };
}

/** Selects all rows shown, or frees them when all are selected already; rows that a filter hides stay as they are. */
export function toggleAll(selection: Selection, shown: readonly string[]): Selection {
  const areAllOn = shown.length > 0 && shown.every((id) => selection.ids.has(id));
  const ids = new Set(selection.ids);
  for (const id of shown) {
    if (areAllOn) ids.delete(id);
    else ids.add(id);
  }
  return { ids, anchor: selection.anchor };
}
