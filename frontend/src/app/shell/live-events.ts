import { DestroyRef, inject, Injectable } from '@angular/core';
import { liveEventSchema, type LiveEvent } from '#shared/contracts/events';
import { filter, Observable, share } from 'rxjs';

type Kind = LiveEvent['kind'];

const FIRST_WAIT_MS = 2_000;
const LONGEST_WAIT_MS = 60_000;

/**
 * Hints from the server that something changed, over one stream that is open while anybody listens. A hint carries no
 * data: whoever shows the thing reads it anew. After a break the server says again what happened meanwhile.
 */
@Injectable({ providedIn: 'root' })
export class LiveEvents {
  private readonly destroyRef = inject(DestroyRef);
  private readonly all = new Observable<LiveEvent>((subscriber) => {
    let source: EventSource | null = null;
    let timer: ReturnType<typeof setTimeout> | undefined;
    let wait = FIRST_WAIT_MS;
    let isAgain = false;
    const connect = (): void => {
      source = new EventSource(`/api/events?ngsw-bypass=true${isAgain ? '&again=true' : ''}`);
      isAgain = true;
      source.addEventListener('open', () => (wait = FIRST_WAIT_MS));
      source.addEventListener('change', (message: MessageEvent<string>) => {
        const event = liveEventSchema.safeParse(JSON.parse(message.data));
        if (event.success) subscriber.next(event.data);
      });
      source.addEventListener('error', () => {
        // A browser gives up for good on some answers, such as 401; so each loss is tried anew, ever more slowly.
        source?.close();
        timer = setTimeout(connect, wait);
        wait = Math.min(wait * 2, LONGEST_WAIT_MS);
      });
    };
    connect();
    const close = (): void => {
      clearTimeout(timer);
      source?.close();
    };
    this.destroyRef.onDestroy(close);
    return close;
  }).pipe(share());

  /** Hints of one kind. The stream opens with the first subscriber and closes with the last. */
  on<K extends Kind>(kind: K): Observable<Extract<LiveEvent, { kind: K }>> {
    return this.all.pipe(filter((event): event is Extract<LiveEvent, { kind: K }> => event.kind === kind));
  }
}
