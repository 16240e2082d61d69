import { sessionSchema } from '#shared/contracts/session';
import { defineRoute } from '../../http/define-route';
import type { SessionDoor } from '../session-door';

/** GET /session */
export const showSession = (door: SessionDoor) =>
  defineRoute({
    method: 'get',
    path: '/session',
    summary: 'Who is signed in, if anybody is',
    access: { kind: 'public', reason: 'Says only whom the own cookie belongs to.' },
    response: sessionSchema,
    handle: async ({ exchange }) => ({ me: await door.whoIsHere(exchange.request, exchange.response) }),
  });
