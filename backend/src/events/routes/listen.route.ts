import { defineRoute } from '../../http/define-route';
import type { LiveEventsService } from '../live-events.service';

/** GET /events */
export const listen = (events: LiveEventsService) =>
  defineRoute({
    method: 'get',
    path: '/events',
    summary: 'Server-sent events: hints of what changed in the own openings',
    access: { kind: 'self', reason: 'Each event is checked against what the listener may see.' },
    response: 'stream',
    handle: ({ caller, exchange }) => events.listen(caller.person, exchange.response),
  });
