import { entryBatchResponseSchema, entryBatchSchema } from '#shared/contracts/sequences';
import { defineRoute } from '../../http/define-route';
import type { EntriesService } from '../entries.service';

/** POST /entries */
export const appendEntries = (entries: EntriesService) =>
  defineRoute({
    method: 'post',
    path: '/entries',
    summary: 'Append entries; each is authorised by its own sequence and answered by itself',
    access: {
      kind: 'self',
      reason: 'Each entry is checked against what its author may do.',
      device: 'first',
    },
    body: entryBatchSchema,
    response: entryBatchResponseSchema,
    handle: async ({ caller, body }) => ({ results: await entries.append(caller, body.entries) }),
  });
