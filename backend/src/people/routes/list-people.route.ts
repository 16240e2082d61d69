import * as z from 'zod/mini';
import { openingPeopleSchema } from '#shared/contracts/openings';
import { openingIdSchema } from '#shared/plant/ids';
import { defineRoute } from '../../http/define-route';
import type { PeopleService } from '../people.service';

/** GET /openings/:openingId/people */
export const listPeople = (people: PeopleService) =>
  defineRoute({
    method: 'get',
    path: '/openings/:openingId/people',
    summary: 'Everybody with a role in the opening',
    access: { kind: 'action', action: 'people.read', subject: 'opening', param: 'openingId' },
    params: z.object({ openingId: openingIdSchema }),
    response: openingPeopleSchema,
    handle: ({ params }) => people.ofOpening(params.openingId),
  });
