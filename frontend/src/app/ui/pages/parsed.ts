import type * as z from 'zod/mini';
import { firstValueFrom, map, type Observable } from 'rxjs';

/**
 * The one answer of a call, checked against its contract: an answer of another shape is an error here, not a surprise
 * three screens later.
 */
export function parsed<T>(call: Observable<unknown>, schema: z.ZodMiniType<T>): Promise<T> {
  return firstValueFrom(call.pipe(map((answer) => schema.parse(answer))));
}
