import * as z from 'zod/mini';
import { photoStoredSchema } from '#shared/contracts/sequences';
import { sequenceIdSchema, sha256Schema } from '#shared/plant/ids';
import { defineRoute } from '../../http/define-route';
import type { PhotosService } from '../photos.service';

const MAX_BYTES = 12_000_000;

/** PUT /sequences/:sequenceId/photos/:sha256 */
export const addPhoto = (photos: PhotosService) =>
  defineRoute({
    method: 'put',
    path: '/sequences/:sequenceId/photos/:sha256',
    summary: 'Keep a photo: a JPEG of exactly the bytes with this SHA-256',
    access: {
      kind: 'self',
      reason: 'Checked per sequence: also somebody whose role has ended delivers what was recorded before.',
      device: 'first',
    },
    params: z.object({ sequenceId: sequenceIdSchema, sha256: sha256Schema }),
    upload: { field: 'photo', maxBytes: MAX_BYTES },
    response: photoStoredSchema,
    handle: ({ caller, params, file }) =>
      photos.add(caller, params.sequenceId, params.sha256, file?.bytes ?? Buffer.alloc(0)),
  });
