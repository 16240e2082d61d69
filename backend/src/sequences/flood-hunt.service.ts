import type { ExpansionDocument, Step } from '#shared/checklist/step';
import type { FloodHunt, FloodHuntRow } from '#shared/contracts/flood-hunt';
import { DomainFailure } from '#shared/failures/failure';
import type { CompanyId, EntryId, OpeningId, SuctionGroupId } from '#shared/plant/ids';
import type { StoredEntry } from '#shared/sequences/entry';
import type { FoldState } from '#shared/sequences/fold-state';
import type { Transactions } from '../database/transactions';
import type { FloodHuntRepository, GroupCircuitRow } from './flood-hunt.repository';
import type { SequencesRepository } from './sequences.repository';
import { toStored } from './sequences.service';
import type { StepLists } from './step-lists';

interface GroupCircuit extends GroupCircuitRow {
  readonly state: FoldState;
  readonly document: ExpansionDocument;
}

/** Where liquid that comes back to a suction group may come from: how each of its coils was left. */
export class FloodHuntService {
  constructor(
    private readonly transactions: Transactions,
    private readonly repository: FloodHuntRepository,
    private readonly sequences: SequencesRepository,
    private readonly stepLists: StepLists,
  ) {}

  /**
   * Every coil of a suction group that has a superheat step. Four queries, however many circuits there are.
   *
   * @throws {DomainFailure} notFound: this opening has no such group
   */
  async show(openingId: OpeningId, groupId: SuctionGroupId): Promise<FloodHunt> {
    const { outside } = this.transactions;
    const suctionGroupName = await this.repository.findGroupName(outside, openingId, groupId);
    if (suctionGroupName === null) throw new DomainFailure('notFound', 'There is no such suction group.');
    const circuits = await this.circuitsOf(openingId, groupId);
    const rows = await this.sequences.findEntriesById(outside, circuits.flatMap(entriesWanted));
    const entries = new Map(rows.map((row) => [row.id as EntryId, toStored(row)]));
    const now = Date.now();
    return {
      suctionGroupName,
      coils: circuits.flatMap((circuit) => coilsOf(circuit, entries, now)),
    };
  }

  private async circuitsOf(openingId: OpeningId, groupId: SuctionGroupId): Promise<GroupCircuit[]> {
    const { outside } = this.transactions;
    const rows = await this.repository.findCircuits(outside, openingId, groupId);
    const [first] = rows;
    if (!first) return [];
    const hashes = rows.map(({ stepListHash }) => stepListHash);
    const documents = await this.stepLists.findAll(outside, first.companyId as CompanyId, hashes);
    return rows.flatMap((row) => {
      const document = documents.get(row.stepListHash);
      return document ? [{ ...row, document, state: JSON.parse(row.fold) as FoldState }] : [];
    });
  }
}

const isWatchedDefrost = (step: Step): boolean =>
  step.kind === 'measurement' && step.method === 'witnessedDefrost';

/** What was last recorded on the superheats and on the watched defrosts of a circuit. */
function entriesWanted({ document, state }: GroupCircuit): EntryId[] {
  return document.stepList.steps
    .filter((step) => step.kind === 'superheat' || isWatchedDefrost(step))
    .flatMap((step) => state.steps[step.key]?.entryId ?? []);
}

function coilsOf(
  circuit: GroupCircuit,
  entries: ReadonlyMap<EntryId, StoredEntry>,
  now: number,
): FloodHuntRow[] {
  const { document, state, sequenceId, code, loadW } = circuit;
  const { fixtures } = document.specification.circuit;
  return document.stepList.steps.flatMap((step) => {
    if (step.kind !== 'superheat') return [];
    const fixture = fixtures.find(({ id }) => id === step.fixtureId);
    const coil = fixture?.coils.find(({ id }) => id === step.coilId);
    if (!fixture || !coil) return [];
    const fold = state.steps[step.key];
    const figures = fold && entries.get(fold.entryId)?.server.judgement?.figures;
    const figure = (label: string) => figures?.find((each) => each.label === label)?.value ?? null;
    return [
      {
        coilId: coil.id,
        coilNumber: coil.number,
        fixtureTag: fixture.tag,
        circuitCode: code,
        sequenceId,
        stepKey: step.key,
        superheatK: figure('superheat'),
        minimumSuperheatK: figure('superheatLow'),
        // A reading that doesn't count clears no coil.
        asLeftStale: !!fold && (fold.reopenedBy !== null || !fold.counts),
        sinceDefrostS: sinceDefrost(circuit, entries, now),
        overrideStanding: document.stepList.steps.some(
          (each) =>
            state.steps[each.key]?.overrideStanding &&
            (each.fixtureId === null || each.fixtureId === fixture.id) &&
            (each.coilId === null || each.coilId === coil.id),
        ),
        loadW,
      },
    ];
  });
}

/** By the clock of the phone that recorded it: `null` when it runs ahead, or nobody watched a defrost. */
function sinceDefrost(
  { document, state }: GroupCircuit,
  entries: ReadonlyMap<EntryId, StoredEntry>,
  now: number,
): number | null {
  const ends = document.stepList.steps
    .filter(isWatchedDefrost)
    .flatMap((step) => state.steps[step.key]?.entryId ?? [])
    .flatMap((id) => entries.get(id) ?? [])
    .filter(({ body }) => body.content.kind === 'answer')
    .map(({ body }) => Date.parse(body.deviceTime));
  const latest = Math.max(...ends);
  return Number.isFinite(latest) && latest <= now ? (now - latest) / 1000 : null;
}
