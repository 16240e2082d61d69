import type { Text } from '#shared/checklist/text';
import type { SequenceView } from '#shared/sequences/sequence-view';

/**
 * The pictures that stand on other steps of a circuit, by their hash and by that of the camera's file: the same picture
 * twice may be meant, but whoever takes it should know.
 *
 * @returns the title of the step that each stands on
 */
export function photosElsewhere(view: SequenceView, stepKey: string): ReadonlyMap<string, Text> {
  const found = new Map<string, Text>();
  for (const { step, current } of view.steps) {
    const content = current?.body.content;
    if (step.key === stepKey || content?.kind !== 'answer' || content.answer.kind !== 'photo') continue;
    for (const { sha256, originalSha256 } of content.answer.photos) {
      found.set(sha256, step.title);
      if (originalSha256) found.set(originalSha256, step.title);
    }
  }
  return found;
}
