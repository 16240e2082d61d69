import { languageRequestSchema } from '#shared/contracts/session';
import { defineRoute } from '../../http/define-route';
import type { SessionService } from '../session.service';

/** PUT /session/language */
export const setLanguage = (sessions: SessionService) =>
  defineRoute({
    method: 'put',
    path: '/session/language',
    summary: 'Choose the own language, for screens and mails',
    access: { kind: 'self', reason: 'Concerns only the own account.' },
    body: languageRequestSchema,
    response: 'nothing',
    handle: ({ caller, body }) => sessions.setLanguage(caller.person.id, body.language),
  });
