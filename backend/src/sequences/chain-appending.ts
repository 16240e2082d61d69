import { isDone } from '#shared/sequences/sequence-view';
import { applyEntry } from '#shared/sequences/fold';
import { canonicalJson } from '#shared/sequences/canonical-json';
import { chainHash } from '#shared/sequences/chain';
import type { EntryBody, ServerPart, Standing } from '#shared/sequences/entry';
import type { FoldState } from '#shared/sequences/fold-state';
import type { Judgement } from '#shared/checklist/judgement';
import { JUDGING_VERSION } from '#shared/checklist/judge';
import type { Step } from '#shared/checklist/step';
import type { EntryEntity } from './entry.entity';
import type { SequenceEntity } from './sequence.entity';

export interface EntryToAppend {
  readonly body: EntryBody;
  readonly bodyHash: string;
  readonly standing: Standing;
  readonly judgement: Judgement | null;
}

/** One entry that found its place in the chain. */
export interface AppendedEntry {
  readonly row: EntryEntity;
  readonly server: ServerPart;
}

/**
 * Gives one entry its place behind the fold's head. Pure: the caller holds the sequence's row lock and writes what
 * comes out.
 *
 * @param receivedAt the server's clock
 */
export function appendToChain(
  fold: FoldState,
  companyId: string,
  item: EntryToAppend,
  steps: readonly Step[],
  receivedAt: Date,
): { fold: FoldState; appended: AppendedEntry } {
  const { body, bodyHash } = item;
  const placed = { position: fold.headPosition + 1, standing: item.standing, judgement: item.judgement };
  const server: ServerPart = {
    ...placed,
    receivedAt: receivedAt.toISOString(),
    judgingVersion: JUDGING_VERSION,
    stateAfter: applyEntry(fold, { body, server: placed, hash: null }, steps).state,
  };
  const hash = chainHash(fold.headHash, bodyHash, server);
  const row: EntryEntity = {
    id: body.id,
    companyId,
    sequenceId: body.sequenceId,
    position: server.position,
    authorId: body.authorId,
    deviceId: body.deviceId,
    deviceCount: body.deviceCount,
    kind: body.content.kind,
    standing: item.standing,
    receivedAt,
    body: canonicalJson(body),
    bodyHash,
    serverPart: canonicalJson(server),
    previousHash: fold.headHash,
    hash,
  };
  return { fold: applyEntry(fold, { body, server, hash }, steps), appended: { row, server } };
}

/** The columns of a sequence's row that follow from its fold. */
export type FoldColumns = Pick<
  SequenceEntity,
  | 'state'
  | 'fold'
  | 'headPosition'
  | 'headHash'
  | 'round'
  | 'stepsTotal'
  | 'stepsDone'
  | 'outsideCount'
  | 'notApplicableCount'
  | 'answeredTwiceCount'
  | 'lateCount'
>;

export function foldColumns(fold: FoldState, steps: readonly Step[]): FoldColumns {
  const columns = { stepsDone: 0, outsideCount: 0, notApplicableCount: 0, answeredTwiceCount: 0 };
  for (const step of steps) {
    const at = fold.steps[step.key];
    if (!at) continue;
    if (isDone(at)) columns.stepsDone += 1;
    if (at.outcome === 'outside') columns.outsideCount += 1;
    if (at.outcome === 'notApplicable') columns.notApplicableCount += 1;
    if (at.answeredTwice) columns.answeredTwiceCount += 1;
  }
  return {
    state: fold.state,
    fold: JSON.stringify(fold),
    headPosition: fold.headPosition,
    headHash: fold.headHash,
    round: fold.round,
    stepsTotal: steps.length,
    lateCount: fold.lateCount + fold.heldCount,
    ...columns,
  };
}
