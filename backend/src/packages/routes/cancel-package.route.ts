import * as z from 'zod/mini';
import { packageSchema } from '#shared/contracts/packages';
import { packageIdSchema } from '#shared/plant/ids';
import { defineRoute } from '../../http/define-route';
import type { PackagesService } from '../packages.service';

/** POST /packages/:packageId/cancellation */
export const cancelPackage = (packages: PackagesService) =>
  defineRoute({
    method: 'post',
    path: '/packages/:packageId/cancellation',
    summary: 'Stop a package that is being built',
    access: { kind: 'action', action: 'package.issue', subject: 'package', param: 'packageId' },
    params: z.object({ packageId: packageIdSchema }),
    response: packageSchema,
    handle: ({ caller, params }) => packages.cancel(caller, params.packageId),
  });
