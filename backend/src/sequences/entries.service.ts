import { judge } from '#shared/checklist/judge';
import { refusedJudgement, plainJudgement, type Judgement } from '#shared/checklist/judgement';
import type { StepList } from '#shared/checklist/step';
import { may } from '#shared/access/may';
import type { EntryResult } from '#shared/contracts/sequences';
import type { EntryId, SequenceId } from '#shared/plant/ids';
import { bodyHash } from '#shared/sequences/chain';
import { entryBodySchema, type EntryBody, type Standing } from '#shared/sequences/entry';
import type { FoldState } from '#shared/sequences/fold-state';
import type { Caller } from '../http/define-route';
import { isDuplicate, type Context, type Transactions } from '../database/transactions';
import type { LiveEventsService } from '../events/live-events.service';
import type { PeopleService } from '../people/people.service';
import { appendToChain, foldColumns, type AppendedEntry } from './chain-appending';
import { refusedResult, storedResult, type RefusalCode } from './entry-results';
import type { LockedSequence, SequencesRepository } from './sequences.repository';
import type { StepLists } from './step-lists';

type Checked =
  { readonly ok: true; readonly body: EntryBody } | { readonly ok: false; readonly result: EntryResult };

interface Item {
  readonly index: number;
  readonly body: EntryBody;
  readonly bodyHash: string;
}

/**
 * Takes in what devices recorded. An entry is never refused for the state that it meets: on an approved sequence it is
 * appended as late, from somebody who is no longer allowed it is held. Only what can't be an entry of the caller is
 * refused, by itself, without holding up the others of its batch.
 */
export class EntriesService {
  constructor(
    private readonly transactions: Transactions,
    private readonly sequences: SequencesRepository,
    private readonly stepLists: StepLists,
    private readonly people: PeopleService,
    private readonly events: LiveEventsService,
  ) {}

  /** Appends a batch; the results are in the order of the entries. Sending the same again answers `alreadyStored`. */
  async append(
    caller: Caller,
    batch: readonly { readonly body?: unknown; readonly bodyHash: string }[],
  ): Promise<EntryResult[]> {
    const results = new Array<EntryResult>(batch.length);
    const bySequence = new Map<SequenceId, Item[]>();
    const ownDevices = new Set<string>(caller.deviceId ? [caller.deviceId] : []);
    for (const [index, sent] of batch.entries()) {
      const checked = await this.check(caller, sent, ownDevices);
      if (!checked.ok) results[index] = checked.result;
      else {
        const { sequenceId } = checked.body;
        const others = bySequence.get(sequenceId) ?? [];
        bySequence.set(sequenceId, [...others, item(index, checked.body, sent)]);
      }
    }
    for (const [sequenceId, items] of bySequence) {
      for (const [index, result] of await this.appendToSequence(caller, sequenceId, items))
        results[index] = result;
    }
    return results;
  }

  private async check(
    caller: Caller,
    sent: { readonly body?: unknown; readonly bodyHash: string },
    ownDevices: Set<string>,
  ): Promise<Checked> {
    const refuse = (code: RefusalCode, path?: string): Checked => ({
      ok: false,
      result: refusedResult(idOf(sent.body), code, path ? { path } : {}),
    });
    const parsed = entryBodySchema.safeParse(sent.body);
    if (!parsed.success) return refuse('notAnEntry', parsed.error.issues[0]?.path.join('.'));
    const body = parsed.data;
    if (bodyHash(body) !== sent.bodyHash) return refuse('changedOnTheWay');
    if (body.authorId !== caller.person.id) return refuse('otherAuthor');
    if (body.deviceId === null || body.content.kind === 'expansion' || body.content.kind === 'review')
      return refuse('serverOnly');
    if (!ownDevices.has(body.deviceId)) {
      if (!(await this.people.isDeviceOf(body.deviceId, caller.person.id))) return refuse('unknownDevice');
      ownDevices.add(body.deviceId);
    }
    return { ok: true, body };
  }

  private async appendToSequence(
    caller: Caller,
    sequenceId: SequenceId,
    items: readonly Item[],
  ): Promise<[number, EntryResult][]> {
    try {
      return await this.transactions.run((context) => this.write(context, caller, sequenceId, items));
    } catch (error) {
      // Some of them are here already: a response got lost on the way. The slower path finds out which.
      if (!isDuplicate(error)) throw error;
      return this.transactions.run((context) => this.writeAgain(context, caller, sequenceId, items));
    }
  }

  private async writeAgain(
    context: Context,
    caller: Caller,
    sequenceId: SequenceId,
    items: readonly Item[],
  ): Promise<[number, EntryResult][]> {
    const sequence = await this.sequences.lock(context, sequenceId);
    const stored = await this.sequences.findEntriesById(
      context,
      items.map(({ body }) => body.id),
    );
    const byId = new Map(stored.map((row) => [row.id as EntryId, row]));
    const state = sequence ? (JSON.parse(sequence.fold) as FoldState).state : 'open';
    const known: [number, EntryResult][] = [];
    const missing: Item[] = [];
    const inThisBatch = new Set<EntryId>();
    const twins: Item[] = [];
    for (const entry of items) {
      const row = byId.get(entry.body.id);
      if (row && row.bodyHash !== entry.bodyHash) {
        known.push([entry.index, refusedResult(row.id, 'idTaken')]);
      } else if (row)
        known.push([entry.index, storedResult('alreadyStored', row, JSON.parse(row.serverPart), state)]);
      else if (!inThisBatch.has(entry.body.id)) missing.push(entry);
      else twins.push(entry);
      inThisBatch.add(entry.body.id);
    }
    if (missing.length > 0) known.push(...(await this.write(context, caller, sequenceId, missing)));
    for (const twin of twins) known.push([twin.index, twinResult(known, twin)]);
    return known;
  }

  private async write(
    context: Context,
    caller: Caller,
    sequenceId: SequenceId,
    items: readonly Item[],
  ): Promise<[number, EntryResult][]> {
    const sequence = await this.sequences.lock(context, sequenceId);
    const allowed = sequence && (await this.standingOf(context, caller, sequence));
    if (!sequence || !allowed) {
      return items.map(({ index, body }) => [index, refusedResult(body.id, 'noSuchSequence')]);
    }
    const { stepList } = await this.stepLists.find(context, sequence.companyId, sequence.stepListHash);
    const { steps } = stepList;
    const before = JSON.parse(sequence.fold) as FoldState;
    let fold = before;
    const appended: AppendedEntry[] = [];
    const now = new Date();
    for (const { body, bodyHash: hash } of items) {
      const standing: Standing = allowed === 'held' ? 'held' : fold.state === 'approved' ? 'late' : 'inOrder';
      const judgement = judgeContent(body, stepList);
      const next = appendToChain(
        fold,
        sequence.companyId,
        { body, bodyHash: hash, standing, judgement },
        steps,
        now,
      );
      fold = next.fold;
      appended.push(next.appended);
    }
    await this.sequences.insertEntries(
      context,
      appended.map(({ row }) => row),
    );
    const submitted = fold.state === 'submitted' && before.state !== 'submitted';
    await this.sequences.update(context, sequenceId, {
      ...foldColumns(fold, steps),
      ...(submitted ? { submittedAt: now, submittedBy: fold.submittedBy } : {}),
    });
    await this.announce(context, sequence, before, fold);
    return items.map(({ index }, at) => {
      const { row, server } = appended[at] as AppendedEntry;
      return [index, storedResult('stored', row, server, fold.state)];
    });
  }

  private async standingOf(
    context: Context,
    caller: Caller,
    sequence: LockedSequence,
  ): Promise<'inOrder' | 'held' | null> {
    if (may(caller.person, 'entry.append', sequence)) return 'inOrder';
    const was = await this.people.wasEverMember(context, sequence.openingId, caller.person.id);
    return was ? 'held' : null;
  }

  /** Others are told of what changes a circuit's place in the work, not of each reading. */
  private async announce(
    context: Context,
    sequence: LockedSequence,
    before: FoldState,
    after: FoldState,
  ): Promise<void> {
    const begun = before.headPosition <= 1;
    const flagged = after.lateCount !== before.lateCount || after.heldCount !== before.heldCount;
    // A queue that shows a submitted sequence must hear of everything that changes its head.
    if (!begun && !flagged && before.state === after.state && after.state !== 'submitted') return;
    await this.events.announce(context, sequence.companyId, {
      kind: 'sequenceChanged',
      openingId: sequence.openingId,
      sequenceId: sequence.id,
      state: after.state,
    });
  }
}

function item(index: number, body: EntryBody, sent: { readonly bodyHash: string }): Item {
  return { index, body, bodyHash: sent.bodyHash };
}

/** The same entry twice in one batch: the second is answered by what became of the first. */
function twinResult(known: readonly [number, EntryResult][], twin: Item): EntryResult {
  const first = known.find(([, result]) => result.id === twin.body.id)?.[1];
  if (first?.result === 'stored') return { ...first, result: 'alreadyStored' };
  return first ?? refusedResult(twin.body.id, 'twiceInBatch');
}

function idOf(body: unknown): string | null {
  const id = (body as { id?: unknown } | null)?.id;
  return typeof id === 'string' ? id.slice(0, 64) : null;
}

/** The server's own judgement; the device's stays in the body as what it was. */
function judgeContent(body: EntryBody, { steps, facts }: StepList): Judgement | null {
  const { content } = body;
  if (content.kind !== 'answer' && content.kind !== 'notApplicable') return null;
  const step = steps.find((candidate) => candidate.key === content.stepKey);
  if (!step) return refusedJudgement('unknownStep');
  return content.kind === 'answer' ? judge(step, content.answer, facts) : plainJudgement('notApplicable');
}
