import * as z from 'zod/mini';
import { defineRoute } from '../../http/define-route';
import type { LiveEventsService } from '../live-events.service';

/** GET /events */
export const listen = (events: LiveEventsService) =>
  defineRoute({
    method: 'get',
    path: '/events',
    summary: 'Server-sent events: hints of what changed in the own openings',
    access: { kind: 'self', reason: 'Each event is checked against what the listener may see.' },
    query: z.object({ again: z.optional(z.enum(['true', 'false'])) }),
    response: 'stream',
    handle: ({ caller, query, exchange }) =>
      events.listen(caller.person, exchange.response, query.again === 'true'),
  });
