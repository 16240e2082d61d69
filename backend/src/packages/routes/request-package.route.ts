import * as z from 'zod/mini';
import { packageRequestSchema, packageSchema } from '#shared/contracts/packages';
import { openingIdSchema } from '#shared/plant/ids';
import { defineRoute } from '../../http/define-route';
import type { PackagesService } from '../packages.service';

/** POST /openings/:openingId/packages */
export const requestPackage = (packages: PackagesService) =>
  defineRoute({
    method: 'post',
    path: '/openings/:openingId/packages',
    summary: 'Have a handover package built',
    access: { kind: 'action', action: 'package.issue', subject: 'opening', param: 'openingId' },
    params: z.object({ openingId: openingIdSchema }),
    body: packageRequestSchema,
    response: packageSchema,
    status: 202,
    handle: ({ caller, params, body }) => packages.request(caller, params.openingId, body.language),
  });
