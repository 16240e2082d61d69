import { DomainFailure } from '#shared/failures/failure';
import type { Problem, SourceText } from './source-text';

/** Beyond this many problems the rest is noise of the first ones. */
const MOST_PLACES = 50;

/**
 * Refuses a template with everything that is wrong in it, in reading order.
 *
 * @throws {DomainFailure} templateRefused, always
 */
export function refuseTemplate(source: SourceText, problems: readonly Problem[]): never {
  const sorted = [...problems].sort((a, b) => a.offset - b.offset);
  const places = sorted.slice(0, MOST_PLACES).map((problem) => source.placeOf(problem));
  const count = problems.length === 1 ? 'a problem' : `${problems.length} problems`;
  throw new DomainFailure(
    'templateRefused',
    `${source.fileName} has ${count}; the first is at ${places[0]?.path ?? source.fileName}: ${sorted[0]?.sentence ?? ''}`,
    places,
  );
}
