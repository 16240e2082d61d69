import * as z from 'zod/mini';

export const PAGE_SIZE_MAX = 200;

/** Query of every list that can grow: `after` is the opaque cursor that the page before gave as `next`. */
export const pageQueryShape = {
  after: z.optional(z.string().check(z.maxLength(200))),
  limit: z.optional(z.coerce.number().check(z.int(), z.gte(1), z.lte(PAGE_SIZE_MAX))),
} as const;

/** A page of `item`s; `next` is null on the last one. */
export function pageOf<T extends z.ZodMiniType>(item: T) {
  return z.object({ items: z.array(item), next: z.nullable(z.string()) });
}
