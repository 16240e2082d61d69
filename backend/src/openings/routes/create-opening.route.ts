import { newOpeningSchema, openingDetailSchema } from '#shared/contracts/openings';
import { defineRoute } from '../../http/define-route';
import type { OpeningsService } from '../openings.service';

/** POST /openings */
export const createOpening = (openings: OpeningsService) =>
  defineRoute({
    method: 'post',
    path: '/openings',
    summary: 'Make an opening',
    access: { kind: 'action', action: 'opening.create', subject: 'company' },
    body: newOpeningSchema,
    response: openingDetailSchema,
    status: 201,
    handle: ({ caller, body }) => openings.create(caller.person, body),
  });
