import * as z from 'zod/mini';
import { packageIdSchema } from '#shared/plant/ids';
import { defineRoute } from '../../http/define-route';
import { streamFile } from '../../http/stream-file';
import type { PackagesService } from '../packages.service';

/** GET /packages/:packageId/document */
export const readPackage = (packages: PackagesService) =>
  defineRoute({
    method: 'get',
    path: '/packages/:packageId/document',
    summary: 'The document (PDF), whole or a range of it',
    access: { kind: 'action', action: 'package.read', subject: 'package', param: 'packageId' },
    params: z.object({ packageId: packageIdSchema }),
    query: z.object({ download: z.optional(z.enum(['true', 'false'])) }),
    response: 'stream',
    async handle({ params, query, headers, exchange }) {
      const file = await packages.read(params.packageId, headers.range);
      if (!file) {
        exchange.response.status(416).end();
        return;
      }
      await streamFile(exchange.response, file, {
        'Content-Type': 'application/pdf',
        'Cache-Control': 'private, max-age=0, must-revalidate',
        'Content-Disposition': `${query.download === 'true' ? 'attachment' : 'inline'}; filename="${file.fileName}"`,
      });
    },
  });
