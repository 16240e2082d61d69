import { createHash } from 'node:crypto';
import { DomainFailure, TemporaryFailure } from '#shared/failures/failure';
import { may } from '#shared/access/may';
import type { CompanyId, OpeningId, SequenceId } from '#shared/plant/ids';
import type { Transactions } from '../database/transactions';
import type { LiveEventsService } from '../events/live-events.service';
import { checkJpeg } from '../files/jpeg-check';
import type { ObjectStorage, StoredObject } from '../files/object-storage';
import type { PhotoRenderer } from '../files/photo-renderer';
import type { Caller } from '../http/define-route';
import type { JobPayloads } from '../jobs/job-kinds';
import type { JobRun } from '../jobs/job-worker';
import type { JobsService } from '../jobs/jobs.service';
import type { PeopleService } from '../people/people.service';
import type { PhotosRepository } from './photos.repository';
import type { SequencesRepository } from './sequences.repository';

export type PhotoSize = 'full' | 'thumbnail' | 'print';

/** Where a photo's bytes are kept. The company's id comes first: nobody learns from a hash what others have. */
export function photoKey(companyId: string, sha256: string, size: PhotoSize): string {
  return `${companyId}/photos/${sha256}${size === 'full' ? '' : `.${size}`}.jpg`;
}

/** Photos: taken in as exactly the bytes that an entry names, looked at fully by a job, given out through us. */
export class PhotosService {
  constructor(
    private readonly transactions: Transactions,
    private readonly sequences: SequencesRepository,
    private readonly photos: PhotosRepository,
    private readonly people: PeopleService,
    private readonly storage: ObjectStorage,
    private readonly renderer: PhotoRenderer,
    private readonly jobs: JobsService,
    private readonly events: LiveEventsService,
  ) {}

  /**
   * Keeps a photo.
   *
   * @throws {DomainFailure} notAnImage, tooLarge; invalidInput when the bytes don't have the hash of the path
   */
  async add(
    caller: Caller,
    sequenceId: SequenceId,
    sha256: string,
    bytes: Buffer,
  ): Promise<{ sha256: string; alreadyThere: boolean }> {
    const { width, height } = checkJpeg(bytes);
    if (createHash('sha256').update(bytes).digest('hex') !== sha256) {
      throw new DomainFailure('invalidInput', 'The photo was changed on the way: its hash is another.', [
        { path: 'path.sha256', message: 'It is not the SHA-256 of the bytes sent.' },
      ]);
    }
    const sequence = await this.sequences.find(this.transactions.outside, sequenceId);
    if (!sequence || !(await this.mayAdd(caller, sequence))) {
      throw new DomainFailure('notFound', 'There is no such sequence here.');
    }
    const known = await this.photos.find(this.transactions.outside, sequenceId, sha256);
    if (known) return { sha256, alreadyThere: true };
    // The bytes first: a row without bytes would be a promise that can't be kept.
    await this.storage.put(photoKey(sequence.companyId, sha256, 'full'), bytes, bytes.length, 'image/jpeg');
    await this.transactions.run(async (context) => {
      const photo = {
        sequenceId,
        sha256,
        companyId: sequence.companyId,
        openingId: sequence.openingId,
        personId: caller.person.id,
        bytes: bytes.length,
        width,
        height,
        state: 'received',
        failure: null,
        createdAt: new Date(),
      };
      await this.photos.insertIfNew(context, photo);
      await this.jobs.enqueue(context, sequence.companyId, 'photoCheck', `photo ${sequenceId} ${sha256}`, {
        sequenceId,
        sha256,
      });
    });
    return { sha256, alreadyThere: false };
  }

  private async mayAdd(caller: Caller, sequence: { companyId: string; openingId: string }): Promise<boolean> {
    const subject = {
      companyId: sequence.companyId as CompanyId,
      openingId: sequence.openingId as OpeningId,
    };
    if (may(caller.person, 'photo.add', subject)) return true;
    return this.people.wasEverMember(this.transactions.outside, subject.openingId, caller.person.id);
  }

  /** A photo's bytes; a thumbnail that isn't made yet is answered by the photo itself. */
  async read(sequenceId: SequenceId, sha256: string, size: PhotoSize): Promise<StoredObject> {
    const photo = await this.photos.find(this.transactions.outside, sequenceId, sha256);
    if (!photo) throw new DomainFailure('notFound', 'This photo has not arrived.');
    const wanted = photo.state === 'checked' ? size : 'full';
    const object = await this.storage.get(photoKey(photo.companyId, sha256, wanted));
    if (!object) throw new DomainFailure('notFound', 'This photo is not in the store.');
    return object;
  }

  /** What a document shows of a photo; `null` when it isn't here or can't be opened. */
  async readForPrint(sequenceId: SequenceId, sha256: string): Promise<Buffer | null> {
    const photo = await this.photos.find(this.transactions.outside, sequenceId, sha256);
    if (photo?.state !== 'checked') return null;
    return this.storage.getBuffer(photoKey(photo.companyId, sha256, 'print'));
  }

  /** The job: decodes the photo fully, keeps its smaller renditions, and flags it when it is broken. */
  async check({ sequenceId, sha256 }: JobPayloads['photoCheck'], run: JobRun): Promise<void> {
    const photo = await this.photos.find(this.transactions.outside, sequenceId, sha256);
    if (!photo || photo.state === 'checked') return;
    const bytes = await this.storage.getBuffer(photoKey(photo.companyId, sha256, 'full'));
    if (!bytes) throw new TemporaryFailure('The photo is not in the store yet');
    const finding = await this.renderer.render(bytes, run.signal);
    if (finding.ok) {
      for (const size of ['thumbnail', 'print'] as const) {
        const content = Buffer.from(finding.renditions[size]);
        await this.storage.put(
          photoKey(photo.companyId, sha256, size),
          content,
          content.length,
          'image/jpeg',
        );
      }
    }
    await this.transactions.run(async (context) => {
      const failure = finding.ok ? null : finding.reason;
      await this.photos.setState(context, sequenceId, sha256, failure ? 'broken' : 'checked', failure);
      const openingId = photo.openingId as never;
      await this.events.announce(context, photo.companyId, {
        kind: 'sequenceChanged',
        openingId,
        sequenceId,
        state: failure ? 'photoBroken' : 'photoChecked',
      });
    });
  }
}
