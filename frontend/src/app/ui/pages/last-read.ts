import { linkedSignal, type Resource, type Signal } from '@angular/core';

/**
 * What a resource read last, kept on the screen while it is read anew and when that fails; gone as soon as something
 * else is asked for.
 */
export function lastRead<T>(resource: Resource<T | undefined>): Signal<T | undefined> {
  return linkedSignal<{ value: T | undefined; isOther: boolean }, T | undefined>({
    source: () => ({
      value: resource.hasValue() ? resource.value() : undefined,
      isOther: resource.status() === 'loading' || resource.status() === 'idle',
    }),
    computation: ({ value, isOther }, before) => value ?? (isOther ? undefined : before?.value),
  }).asReadonly();
}
