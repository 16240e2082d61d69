import type { Step } from '#shared/checklist/step';
import { DomainFailure } from '#shared/failures/failure';
import type { CircuitId, CompanyId, OpeningId, PersonId, SequenceId } from '#shared/plant/ids';
import type { EntryBody } from '#shared/sequences/entry';
import type { FoldState } from '#shared/sequences/fold-state';
import type { Context } from '../database/transactions';
import { appendToChain, foldColumns } from './chain-appending';
import { photosNamedBy } from './photo-statuses';
import type { PhotosRepository } from './photos.repository';
import type { SequencesRepository } from './sequences.repository';
import type { StepLists } from './step-lists';

/** A sequence under its row lock, as a reviewer's verdict meets it. */
export interface LockedForReview {
  readonly id: SequenceId;
  readonly companyId: CompanyId;
  readonly openingId: OpeningId;
  readonly circuitId: CircuitId;
  readonly stepListHash: string;
  readonly fold: FoldState;
  readonly steps: readonly Step[];
}

/** What the reviews feature may do to a sequence: take its lock and append a review to its chain. */
export class SequenceReviewDesk {
  constructor(
    private readonly sequences: SequencesRepository,
    private readonly stepLists: StepLists,
    private readonly photos: PhotosRepository,
  ) {}

  /** @throws {DomainFailure} notFound */
  async lock(context: Context, id: SequenceId): Promise<LockedForReview> {
    const locked = await this.sequences.lock(context, id);
    if (!locked) throw new DomainFailure('notFound', 'There is no such sequence.');
    const { stepList } = await this.stepLists.find(context, locked.companyId, locked.stepListHash);
    return { ...locked, fold: JSON.parse(locked.fold) as FoldState, steps: stepList.steps };
  }

  /** Appends a review entry; returns the fold after it. */
  async append(
    context: Context,
    locked: LockedForReview,
    body: EntryBody,
    bodyHash: string,
  ): Promise<FoldState> {
    const item = { body, bodyHash, standing: 'inOrder' as const, judgement: null };
    const { fold, appended } = appendToChain(locked.fold, locked.companyId, item, locked.steps, new Date());
    await this.sequences.insertEntries(context, [appended.row]);
    await this.sequences.update(context, locked.id, foldColumns(fold, locked.steps));
    return fold;
  }

  /** How many photos that count as evidence have not arrived, or arrived and can't be opened. */
  async countAwaitedPhotos(context: Context, locked: LockedForReview): Promise<number> {
    const current = Object.values(locked.fold.steps).map((step) => step.entryId);
    const rows = await this.sequences.findEntriesById(context, current);
    const photos = await this.photos.findOfSequence(context, locked.id);
    const arrived = new Set(photos.filter(({ state }) => state !== 'broken').map(({ sha256 }) => sha256));
    const named = rows.flatMap((row) => photosNamedBy(JSON.parse(row.body) as EntryBody));
    return new Set(named.filter((sha256) => !arrived.has(sha256))).size;
  }

  /** Whoever recorded or submitted something on it. */
  async recorders(context: Context, id: SequenceId): Promise<PersonId[]> {
    return this.sequences.findRecorders(context, id);
  }
}
