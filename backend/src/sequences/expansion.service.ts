import { uuidv7 } from 'uuidv7';
import type { ExpansionDocument, Step, StepList } from '#shared/checklist/step';
import type { CompanyId, EntryId, OpeningId, PersonId, SequenceId } from '#shared/plant/ids';
import type { CircuitSpecification } from '#shared/plant/plant';
import { canonicalJson } from '#shared/sequences/canonical-json';
import { bodyHash } from '#shared/sequences/chain';
import { emptyFold } from '#shared/sequences/fold';
import type { EntryBody } from '#shared/sequences/entry';
import type { FoldState } from '#shared/sequences/fold-state';
import { sha256OfText } from '#shared/sequences/sha256';
import type { Context } from '../database/transactions';
import type { LiveEventsService } from '../events/live-events.service';
import type { TemplatesService } from '../templates/templates.service';
import { appendToChain, foldColumns } from './chain-appending';
import type { EntryEntity } from './entry.entity';
import type { SequenceEntity } from './sequence.entity';
import type { SequencesRepository } from './sequences.repository';
import type { StepLists } from './step-lists';
import type { StepListEntity } from './step-list.entity';

/** Circuits expanded before others get their turn; also rows in one statement, which bounds its size. */
const SLICE = 25;

interface Expanded extends ExpansionDocument {
  readonly hash: string;
  readonly content: string;
}

/**
 * Turns templates and circuits into sequences. An expansion is an entry of the chain, so that the head binds what was
 * asked as well as what was answered. Sequences that are submitted or approved are left as they are.
 */
export class ExpansionService {
  constructor(
    private readonly templates: TemplatesService,
    private readonly sequences: SequencesRepository,
    private readonly stepLists: StepLists,
    private readonly events: LiveEventsService,
  ) {}

  /**
   * Makes or renews the sequence of each circuit.
   *
   * @returns how many circuits have a sequence afterwards
   */
  async expand(
    context: Context,
    owner: { companyId: CompanyId; openingId: OpeningId },
    specifications: readonly CircuitSpecification[],
    authorId: PersonId,
  ): Promise<number> {
    const expanded = await this.expandAll(context, owner.companyId, specifications);
    const now = new Date();
    const stepLists = stepListRows(owner, expanded, now);
    for (let at = 0; at < stepLists.length; at += SLICE) {
      await this.sequences.insertStepLists(context, stepLists.slice(at, at + SLICE));
    }
    const known = await this.sequences.findByCircuits(
      context,
      expanded.map(({ specification }) => specification.circuit.id),
    );
    const byCircuit = new Map(known.map((row) => [row.circuitId as string, row]));
    const [rows, entries]: [SequenceEntity[], EntryEntity[]] = [[], []];
    for (const item of expanded) {
      const sequence = byCircuit.get(item.specification.circuit.id);
      if (sequence) await this.renew(context, sequence.id as SequenceId, item, authorId, now);
      else begin(owner, item, authorId, now, rows, entries);
    }
    for (let at = 0; at < rows.length; at += SLICE) {
      await this.sequences.insert(context, rows.slice(at, at + SLICE));
      await this.sequences.insertEntries(context, entries.slice(at, at + SLICE));
    }
    return expanded.length;
  }

  /**
   * Brings a sequence that was sent back up to the schedule. An import leaves what is submitted as it is; what goes back
   * to the installer is asked by the schedule that stands now.
   */
  async catchUp(
    context: Context,
    sequence: {
      readonly companyId: CompanyId;
      readonly openingId: OpeningId;
      readonly stepListHash: string;
    },
    specification: CircuitSpecification | undefined,
    authorId: PersonId,
  ): Promise<void> {
    const { companyId, openingId, stepListHash } = sequence;
    const asked = await this.stepLists.find(context, companyId, stepListHash);
    if (!specification || asked.specification.revision === specification.revision) return;
    await this.expand(context, { companyId, openingId }, [specification], authorId);
  }

  private async expandAll(
    context: Context,
    companyId: CompanyId,
    specifications: readonly CircuitSpecification[],
  ): Promise<Expanded[]> {
    const expanded: Expanded[] = [];
    for (let at = 0; at < specifications.length; at += SLICE) {
      const slice = specifications.slice(at, at + SLICE);
      const stepLists = await this.templates.expand(context, companyId, slice);
      for (const [index, stepList] of stepLists.entries()) {
        const specification = slice[index];
        if (stepList && specification) expanded.push(bind({ stepList, specification }));
      }
      // A large store takes seconds of work: others get their turn in between.
      await new Promise((resolve) => setImmediate(resolve));
    }
    return expanded;
  }

  private async renew(
    context: Context,
    id: SequenceId,
    item: Expanded,
    authorId: PersonId,
    now: Date,
  ): Promise<void> {
    const locked = await this.sequences.lock(context, id);
    if (!locked || locked.stepListHash === item.hash) return;
    const fold = JSON.parse(locked.fold) as FoldState;
    if (fold.state !== 'open' && fold.state !== 'sentBack') return;
    const before = await this.stepLists.find(context, locked.companyId, locked.stepListHash);
    const changed = changedSteps(before.stepList, item.stepList);
    const result = appendExpansion(fold, locked.companyId, id, item, { authorId, now, changed });
    await this.sequences.insertEntries(context, [result.row]);
    const submitted = result.fold.state === 'submitted';
    await this.sequences.update(context, id, {
      ...foldColumns(result.fold, item.stepList.steps),
      stepListHash: item.hash,
      // A submission that waited for a step which is no longer asked takes effect now.
      ...(submitted ? { submittedAt: now, submittedBy: result.fold.submittedBy } : {}),
    });
    await this.events.announce(context, locked.companyId, {
      kind: 'sequenceChanged',
      openingId: locked.openingId,
      sequenceId: id,
      state: result.fold.state,
    });
  }
}

/** Keys of the steps that both lists ask and that ask or judge otherwise now; a reworded title changes nothing. */
function changedSteps(before: StepList, after: StepList): string[] {
  const known = new Map(before.steps.map((step) => [step.key, substance(step, before)]));
  return after.steps
    .filter((step) => known.has(step.key) && known.get(step.key) !== substance(step, after))
    .map((step) => step.key);
}

/** Kinds that read a saturation table: a maker's newer one asks these again, and no photo or confirmation. */
const BY_SATURATION: ReadonlySet<Step['kind']> = new Set(['superheat', 'measurement', 'trend']);

function substance(step: Step, { facts }: StepList): string {
  const { title: _title, instruction: _instruction, caution: _caution, section: _section, ...rest } = step;
  const { makersTable: _makersTable, ...others } = facts;
  return canonicalJson({ rest, facts: BY_SATURATION.has(step.kind) ? facts : others });
}

function bind(document: ExpansionDocument): Expanded {
  const content = canonicalJson(document);
  return { ...document, content, hash: sha256OfText(content) };
}

function begin(
  owner: { companyId: CompanyId; openingId: OpeningId },
  item: Expanded,
  authorId: PersonId,
  now: Date,
  rows: SequenceEntity[],
  entries: EntryEntity[],
): void {
  const id = uuidv7() as SequenceId;
  const { row, fold } = appendExpansion(emptyFold(), owner.companyId, id, item, {
    authorId,
    now,
    changed: [],
  });
  entries.push(row);
  rows.push({
    id,
    ...owner,
    circuitId: item.specification.circuit.id,
    stepListHash: item.hash,
    ...foldColumns(fold, item.stepList.steps),
    submittedAt: null,
    submittedBy: null,
    createdAt: now,
  });
}

function appendExpansion(
  fold: FoldState,
  companyId: string,
  sequenceId: SequenceId,
  item: Expanded,
  { authorId, now, changed }: { authorId: PersonId; now: Date; changed: readonly string[] },
): { row: EntryEntity; fold: FoldState } {
  const body: EntryBody = {
    format: 1,
    id: uuidv7() as EntryId,
    sequenceId,
    authorId,
    deviceId: null,
    deviceCount: 0,
    countOnSequence: 0,
    deviceTime: now.toISOString(),
    stepListHash: item.hash,
    supersedes: null,
    content: {
      kind: 'expansion',
      templateKey: item.stepList.template.key,
      templateVersion: item.stepList.template.version,
      specificationRevision: item.specification.revision,
      stepListHash: item.hash,
      changedSteps: [...changed],
    },
  };
  const entry = { body, bodyHash: bodyHash(body), standing: 'inOrder' as const, judgement: null };
  const result = appendToChain(fold, companyId, entry, item.stepList.steps, now);
  return { row: result.appended.row, fold: result.fold };
}

function stepListRows(
  owner: { companyId: CompanyId; openingId: OpeningId },
  expanded: readonly Expanded[],
  createdAt: Date,
): StepListEntity[] {
  const byHash = new Map(expanded.map((item) => [item.hash, item.content]));
  return [...byHash].map(([hash, content]) => ({ ...owner, hash, content, createdAt }));
}
