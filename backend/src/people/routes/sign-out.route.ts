import { defineRoute } from '../../http/define-route';
import type { SessionDoor } from '../session-door';

/** DELETE /session */
export const signOut = (door: SessionDoor) =>
  defineRoute({
    method: 'delete',
    path: '/session',
    summary: 'Sign out of this browser',
    access: { kind: 'public', reason: 'Everybody may leave, also with a session that has ended.' },
    response: 'nothing',
    handle: ({ exchange }) => door.signOut(exchange.request, exchange.response),
  });
