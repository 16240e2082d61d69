import { meSchema } from '#shared/contracts/session';
import { defineRoute } from '../../http/define-route';
import type { SessionService } from '../session.service';

/** GET /session */
export const showSession = (sessions: SessionService) =>
  defineRoute({
    method: 'get',
    path: '/session',
    summary: 'Who is signed in',
    access: { kind: 'self', reason: 'Everybody may know who they are.' },
    response: meSchema,
    handle: ({ caller }) => sessions.me(caller.person.id),
  });
