import type { SequenceDetail } from '#shared/contracts/sequences';
import { Bug, DomainFailure } from '#shared/failures/failure';
import type { CompanyId, EntryId, PersonId, SequenceId } from '#shared/plant/ids';
import type { EntryBody, StoredEntry } from '#shared/sequences/entry';
import type { FoldState } from '#shared/sequences/fold-state';
import { foldEntries } from '#shared/sequences/fold';
import type { Context, Transactions } from '../database/transactions';
import type { Caller } from '../http/define-route';
import type { OpeningsService } from '../openings/openings.service';
import type { PeopleService } from '../people/people.service';
import type { EntryEntity } from './entry.entity';
import { photoStatuses } from './photo-statuses';
import type { PhotosRepository } from './photos.repository';
import type { SequencesRepository } from './sequences.repository';
import type { StepLists } from './step-lists';

/** Sequences as they are read: by the stepper, the review and the package. */
export class SequencesService {
  constructor(
    private readonly transactions: Transactions,
    private readonly sequences: SequencesRepository,
    private readonly photos: PhotosRepository,
    private readonly stepLists: StepLists,
    private readonly openings: OpeningsService,
    private readonly people: PeopleService,
  ) {}

  /**
   * One sequence, to whoever asks. A phone without a session reads its person's circuits and no others.
   *
   * @throws {DomainFailure} notFound
   */
  async showTo(caller: Caller, id: SequenceId): Promise<SequenceDetail> {
    await this.checkOwnWork(caller, id);
    return this.show(id);
  }

  /** @throws {DomainFailure} notFound for a device credential on somebody else's circuit */
  async checkOwnWork(caller: Caller, id: SequenceId): Promise<void> {
    if (caller.via === 'session') return;
    if (await this.sequences.isWorkOf(this.transactions.outside, id, caller.person.id)) return;
    throw new DomainFailure('notFound', 'This is not a circuit of yours. Sign in to see it.');
  }

  /**
   * One sequence with everything in it.
   *
   * @param upTo a position: shows the sequence as it stood then
   */
  async show(
    id: SequenceId,
    upTo?: number,
    context: Context = this.transactions.outside,
  ): Promise<SequenceDetail> {
    const row = await this.sequences.find(context, id);
    if (!row) throw new DomainFailure('notFound', 'There is no such sequence.');
    const opening = await this.openings.find(context, row.openingId as never);
    const entries = (await this.sequences.findEntries(context, id, upTo)).map(toStored);
    const fold = upTo === undefined ? (JSON.parse(row.fold) as FoldState) : null;
    const stepListHash = fold ? row.stepListHash : lastStepList(entries);
    const document = await this.stepLists.find(context, row.companyId as CompanyId, stepListHash);
    const { stepList, specification } = document;
    return {
      id,
      openingId: opening.id as never,
      openingName: opening.name,
      timeZone: opening.timeZone,
      specification,
      stepList,
      stepListHash,
      fold: fold ?? foldEntries(entries, stepList.steps),
      entries,
      people: await this.people.names(context, authorsOf(entries)),
      photos: photoStatuses(entries, await this.photos.findOfSequence(context, id)),
    };
  }
}

/** An entry as the contract has it, from its row; body and server part keep the text that was hashed. */
export function toStored(row: EntryEntity): StoredEntry {
  return {
    body: JSON.parse(row.body) as EntryBody & { id: EntryId },
    bodyHash: row.bodyHash,
    server: JSON.parse(row.serverPart) as StoredEntry['server'],
    previousHash: row.previousHash,
    hash: row.hash,
  };
}

function authorsOf(entries: readonly StoredEntry[]): PersonId[] {
  return [...new Set(entries.map((entry) => entry.body.authorId))];
}

function lastStepList(entries: readonly StoredEntry[]): string {
  for (const { body } of [...entries].reverse()) {
    if (body.content.kind === 'expansion') return body.content.stepListHash;
  }
  throw new Bug('A sequence without an expansion');
}
