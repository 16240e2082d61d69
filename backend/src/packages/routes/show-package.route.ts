import * as z from 'zod/mini';
import { packageSchema } from '#shared/contracts/packages';
import { packageIdSchema } from '#shared/plant/ids';
import { defineRoute } from '../../http/define-route';
import type { PackagesService } from '../packages.service';

/** GET /packages/:packageId */
export const showPackage = (packages: PackagesService) =>
  defineRoute({
    method: 'get',
    path: '/packages/:packageId',
    summary: 'One handover package: how far it is, its hash, its acceptance',
    access: { kind: 'action', action: 'package.read', subject: 'package', param: 'packageId' },
    params: z.object({ packageId: packageIdSchema }),
    response: packageSchema,
    handle: ({ params }) => packages.show(params.packageId),
  });
