import * as z from 'zod/mini';
import { scheduleImportSchema } from '#shared/contracts/schedules';
import { openingIdSchema } from '#shared/plant/ids';
import { defineRoute } from '../../http/define-route';
import type { SchedulesService } from '../schedules.service';

/** A little above the parser's own limit of 5 MB, so that its clearer sentence answers what is just over. */
const MAX_BYTES = 6_000_000;

/** POST /openings/:openingId/schedule-imports */
export const importSchedule = (schedules: SchedulesService) =>
  defineRoute({
    method: 'post',
    path: '/openings/:openingId/schedule-imports',
    summary: 'Check a schedule (CSV), and store it when asked to',
    access: { kind: 'action', action: 'schedule.import', subject: 'opening', param: 'openingId' },
    params: z.object({ openingId: openingIdSchema }),
    query: z.object({ store: z.optional(z.enum(['true', 'false'])) }),
    upload: { field: 'schedule', maxBytes: MAX_BYTES },
    response: scheduleImportSchema,
    handle: ({ caller, params, query, file }) =>
      schedules.import(
        caller.person,
        params.openingId,
        file?.bytes ?? Buffer.alloc(0),
        query.store === 'true',
      ),
  });
