import * as z from 'zod/mini';
import { sequenceIdSchema, sha256Schema } from '#shared/plant/ids';
import { defineRoute } from '../../http/define-route';
import { streamFile } from '../../http/stream-file';
import type { PhotosService } from '../photos.service';
import type { SequencesService } from '../sequences.service';

/** GET /sequences/:sequenceId/photos/:sha256 */
export const showPhoto = (photos: PhotosService, sequences: SequencesService) =>
  defineRoute({
    method: 'get',
    path: '/sequences/:sequenceId/photos/:sha256',
    summary: 'A photo, whole or as a thumbnail',
    access: {
      kind: 'action',
      action: 'photo.read',
      subject: 'sequence',
      param: 'sequenceId',
      device: 'fallback',
    },
    params: z.object({ sequenceId: sequenceIdSchema, sha256: sha256Schema }),
    query: z.object({ size: z.optional(z.enum(['full', 'thumbnail'])) }),
    response: 'stream',
    async handle({ caller, params, query, exchange }) {
      await sequences.checkOwnWork(caller, params.sequenceId);
      const file = await photos.read(params.sequenceId, params.sha256, query.size ?? 'full');
      await streamFile(exchange.response, file, {
        'Content-Type': 'image/jpeg',
        // A thumbnail may still be the photo itself; the bytes under a hash never change.
        'Cache-Control':
          query.size === 'thumbnail' ? 'private, max-age=60' : 'private, max-age=31536000, immutable',
        'Content-Disposition': `inline; filename="${params.sha256.slice(0, 12)}.jpg"`,
      });
    },
  });
