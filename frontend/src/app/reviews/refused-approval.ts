import * as z from 'zod/mini';
import type { Step } from '#shared/checklist/step';
import { problemCodeOf, problemOf } from '../ui/problem-of';

/** What the server says an approval lacks. */
export interface Lacking {
  readonly steps: readonly Step[];
  readonly photos: number;
}

const keysSchema = z.array(z.string());
const countSchema = z.int();

/** What kept an approval from being given, so that it can be put right; `null` when the refusal names nothing. */
export function lackingOf(error: unknown, steps: readonly Step[]): Lacking | null {
  if (problemCodeOf(error) !== 'wrongState') return null;
  const facts = problemOf(error)?.facts ?? {};
  const keys = keysSchema.safeParse(facts['missing']);
  const photos = countSchema.safeParse(facts['awaitedPhotos']);
  const lacking = {
    steps: keys.success ? steps.filter(({ key }) => keys.data.includes(key)) : [],
    photos: photos.success ? photos.data : 0,
  };
  return lacking.steps.length > 0 || lacking.photos > 0 ? lacking : null;
}
