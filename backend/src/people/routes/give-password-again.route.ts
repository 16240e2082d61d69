import { passwordRequestSchema } from '#shared/contracts/session';
import { defineRoute } from '../../http/define-route';
import type { SessionDoor } from '../session-door';
import type { SessionService } from '../session.service';

/** POST /session/password */
export const givePasswordAgain = (door: SessionDoor, sessions: SessionService) =>
  defineRoute({
    method: 'post',
    path: '/session/password',
    summary: 'Give the password again before signing',
    access: { kind: 'self', reason: 'Concerns only the own session.' },
    body: passwordRequestSchema,
    response: 'nothing',
    async handle({ caller, body, exchange }) {
      const me = await sessions.me(caller.person.id);
      await door.passwordAgain(exchange.request, me.id, me.email, body.password);
    },
  });
