import type * as z from 'zod/mini';
import { DomainFailure } from '#shared/failures/failure';

/**
 * Checks one part of a request.
 *
 * @throws {DomainFailure} invalidInput with one place for each thing wrong, its path starting with `part`
 */
export function parseInput<S extends z.ZodMiniType>(schema: S, value: unknown, part: string): z.output<S> {
  const result = schema.safeParse(value);
  if (result.success) return result.data;
  throw new DomainFailure(
    'invalidInput',
    `The ${part} of the request is not as documented.`,
    result.error.issues.slice(0, 50).map((issue) => ({
      path: [part, ...issue.path.map(String)].join('.'),
      message: issue.message,
    })),
  );
}
