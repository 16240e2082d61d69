import * as z from 'zod/mini';
import { packageListSchema } from '#shared/contracts/packages';
import { openingIdSchema } from '#shared/plant/ids';
import { defineRoute } from '../../http/define-route';
import type { PackagesService } from '../packages.service';

/** GET /openings/:openingId/packages */
export const listPackages = (packages: PackagesService) =>
  defineRoute({
    method: 'get',
    path: '/openings/:openingId/packages',
    summary: 'Handover packages of an opening, newest first',
    access: { kind: 'action', action: 'package.read', subject: 'opening', param: 'openingId' },
    params: z.object({ openingId: openingIdSchema }),
    response: packageListSchema,
    handle: async ({ params }) => ({ packages: await packages.list(params.openingId) }),
  });
