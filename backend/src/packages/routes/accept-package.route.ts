import * as z from 'zod/mini';
import { acceptanceRequestSchema, packageSchema } from '#shared/contracts/packages';
import { packageIdSchema } from '#shared/plant/ids';
import { defineRoute } from '../../http/define-route';
import type { PackagesService } from '../packages.service';

/** POST /packages/:packageId/acceptances */
export const acceptPackage = (packages: PackagesService) =>
  defineRoute({
    method: 'post',
    path: '/packages/:packageId/acceptances',
    summary: 'Accept a package with a signature',
    access: { kind: 'action', action: 'package.accept', subject: 'package', param: 'packageId' },
    params: z.object({ packageId: packageIdSchema }),
    body: acceptanceRequestSchema,
    response: packageSchema,
    status: 201,
    handle: ({ caller, params, body }) =>
      packages.accept(caller, params.packageId, body.sha256, body.signature),
  });
