import * as z from 'zod/mini';
import { sequenceDetailSchema } from '#shared/contracts/sequences';
import { sequenceIdSchema } from '#shared/plant/ids';
import { defineRoute } from '../../http/define-route';
import type { SequencesService } from '../sequences.service';

/** GET /sequences/:sequenceId */
export const showSequence = (sequences: SequencesService) =>
  defineRoute({
    method: 'get',
    path: '/sequences/:sequenceId',
    summary: 'One sequence, whole: specification, steps, entries',
    access: {
      kind: 'action',
      action: 'sequence.read',
      subject: 'sequence',
      param: 'sequenceId',
      device: 'fallback',
    },
    params: z.object({ sequenceId: sequenceIdSchema }),
    response: sequenceDetailSchema,
    handle: ({ caller, params }) => sequences.showTo(caller, params.sequenceId),
  });
