/** Fields of a request that a person fills in, for which there are words (`ui.place_<field>`). */
export const PLACE_FIELDS = [
  'name',
  'address',
  'elevationM',
  'openingDate',
  'timeZone',
  'contractorName',
  'personId',
  'circuitIds',
  'signature',
  'remarks',
] as const;

/** Parts of a request, with which a path begins. */
const PARTS: ReadonlySet<string> = new Set(['body', 'query', 'path', 'opening']);

/**
 * The words that tell what is wanted at one place of a refused request: by its path, as the server's own words about it
 * are English.
 *
 * @param path such as `body.timeZone`
 * @returns key in the scope `ui`; a place that no form has is told by its path
 */
export function placeWords(path: string): { key: string; params: Readonly<Record<string, string>> } {
  const field = path.split('.').find((part) => !PARTS.has(part));
  const known = PLACE_FIELDS.find((name) => name === field);
  return known ? { key: `place_${known}`, params: {} } : { key: 'place_other', params: { path: path } };
}
