import { meSchema, signInRequestSchema } from '#shared/contracts/session';
import { defineRoute } from '../../http/define-route';
import type { SessionDoor } from '../session-door';

/** POST /session */
export const signIn = (door: SessionDoor) =>
  defineRoute({
    method: 'post',
    path: '/session',
    summary: 'Sign in with an address and a password',
    access: { kind: 'public', reason: 'Nobody is signed in before this; tries are limited.' },
    body: signInRequestSchema,
    response: meSchema,
    handle: ({ exchange }) => door.signIn(exchange.request, exchange.response),
  });
