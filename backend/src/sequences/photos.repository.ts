import type { SequenceId } from '#shared/plant/ids';
import { managerOf, type Context } from '../database/transactions';
import { PhotoEntity } from './photo.entity';

export class PhotosRepository {
  async find(context: Context, sequenceId: SequenceId, sha256: string): Promise<PhotoEntity | null> {
    return managerOf(context).findOneBy(PhotoEntity, { sequenceId, sha256 });
  }

  async findOfSequence(context: Context, sequenceId: SequenceId): Promise<PhotoEntity[]> {
    return managerOf(context).findBy(PhotoEntity, { sequenceId });
  }

  /** @returns whether it is new */
  async insertIfNew(context: Context, photo: PhotoEntity): Promise<boolean> {
    const result: { affectedRows?: number } = await managerOf(context).query(
      `INSERT INTO photo (sequence_id, sha256, company_id, opening_id, person_id, bytes, width, height, state, failure, created_at)
       VALUES (?, ?, ?, ?, ?, ?, ?, ?, ?, NULL, ?) ON DUPLICATE KEY UPDATE sha256 = VALUES(sha256)`,
      [
        photo.sequenceId,
        photo.sha256,
        photo.companyId,
        photo.openingId,
        photo.personId,
        photo.bytes,
        photo.width,
        photo.height,
        photo.state,
        photo.createdAt,
      ],
    );
    return result.affectedRows === 1;
  }

  async setState(
    context: Context,
    sequenceId: SequenceId,
    sha256: string,
    state: 'checked' | 'broken',
    failure: string | null,
  ): Promise<void> {
    await managerOf(context).update(PhotoEntity, { sequenceId, sha256 }, { state, failure });
  }
}
