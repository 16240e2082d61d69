import type { Step } from '../checklist/step';
import type { EntryId, PersonId } from '../plant/ids';
import { unreachable } from '../failures/unreachable';
import { CHAIN_START } from './chain';
import type { EntryBody, EntryContent, RestsOn, ServerPart } from './entry';
import type { FoldState, StepFold } from './fold-state';
import { changeOf, momentOf, overtakenBy, staleSteps } from './stale';
import { transitionFor } from './transitions';

/** What the fold needs of an entry. One that isn't on the server yet has position 0 and no hash. */
export interface FoldEntry {
  readonly body: EntryBody;
  /** `stateAfter` is absent on an entry that the server hasn't seen: what it does is worked out here. */
  readonly server: Pick<ServerPart, 'position' | 'standing' | 'judgement'> &
    Partial<Pick<ServerPart, 'stateAfter'>>;
  readonly hash: string | null;
}

/** The state of a sequence before its first entry. */
export function emptyFold(): FoldState {
  return {
    state: 'open',
    round: 1,
    headHash: CHAIN_START,
    headPosition: 0,
    stepListHash: null,
    steps: {},
    arrived: {},
    pending: [],
    submittedBy: null,
    recorders: [],
    approvedHead: null,
    lateCount: 0,
    heldCount: 0,
  };
}

/**
 * Carries a sequence's state forward by one entry: the same reducer on the phone (over what it has, sent or not) and on
 * the server (one entry at a time, under the row's lock).
 *
 * @param steps the steps asked for now; a submission is measured against them
 * @returns a new state; the given one is not changed
 */
export function applyEntry(before: FoldState, entry: FoldEntry, steps: readonly Step[]): FoldState {
  const state: FoldState = { ...before };
  if (entry.hash !== null) {
    state.headHash = entry.hash;
    state.headPosition = entry.server.position;
  }
  markArrived(state, entry.body);
  if (entry.server.standing === 'late') return { ...state, lateCount: state.lateCount + 1 };
  if (entry.server.standing === 'held') return { ...state, heldCount: state.heldCount + 1 };
  applyContent(state, entry, entry.body.content);
  if (entry.server.stateAfter === undefined) settlePending(state, steps);
  else if (entry.server.stateAfter !== state.state) takeEffect(state, entry.server.stateAfter);
  return state;
}

/** Folds a whole history, in order of position, unsent entries last. */
export function foldEntries(entries: readonly FoldEntry[], steps: readonly Step[]): FoldState {
  return entries.reduce((state, entry) => applyEntry(state, entry, steps), emptyFold());
}

/** The required steps that a submission would still lack, in working order; a standing override is one of them. */
export function missingSteps(state: FoldState, steps: readonly Step[]): readonly Step[] {
  return steps.filter((step) => {
    const fold = state.steps[step.key];
    // What a lead asked for again is needed, required or not.
    if (fold && (fold.overrideStanding || fold.reopenedBy !== null)) return true;
    return step.required && (!fold || !fold.counts);
  });
}

function applyContent(state: FoldState, entry: FoldEntry, content: EntryContent): void {
  switch (content.kind) {
    case 'answer':
      applyAnswer(state, entry, content);
      return;
    case 'notApplicable':
      if (isUnknownStep(entry)) return;
      setStep(state, content.stepKey, entry, {
        outcome: 'notApplicable',
        counts: true,
        overrideStanding: false,
        signed: null,
      });
      askSignaturesAgain(state, entry.body);
      return;
    case 'submission':
      addPending(state, entry.body, content.restsOn);
      return;
    case 'expansion':
      state.stepListHash = content.stepListHash;
      reopen(state, content.changedSteps, entry.body.id);
      return;
    case 'review':
      applyReview(state, entry, content);
      return;
    default:
      unreachable(content);
  }
}

function applyAnswer(
  state: FoldState,
  entry: FoldEntry,
  content: Extract<EntryContent, { kind: 'answer' }>,
): void {
  const judged = entry.server.judgement ?? content.workedOut;
  if (isUnknownStep(entry)) return;
  const standing = content.answer.kind === 'override' && content.answer.phase === 'set';
  setStep(state, content.stepKey, entry, {
    outcome: judged.outcome,
    counts: judged.counts,
    overrideStanding: standing,
    signed:
      content.answer.kind === 'signature'
        ? { deviceId: entry.body.deviceId, count: entry.body.countOnSequence }
        : null,
    ...(content.answer.kind === 'superheat' && judged.counts ? { readAt: momentOf(entry.body) } : {}),
  });
  applyChange(state, entry, content);
  // A note is a word beside the work, not part of what was signed for.
  if (content.answer.kind !== 'signature' && content.answer.kind !== 'note') {
    askSignaturesAgain(state, entry.body);
  }
}

/** What a change on the circuit makes stale, and whether a superheat was overtaken by one before it arrived. */
function applyChange(
  state: FoldState,
  entry: FoldEntry,
  content: Extract<EntryContent, { kind: 'answer' }>,
): void {
  const { stepKey } = content;
  const fold = state.steps[stepKey];
  const overtaking = fold?.readAt ? overtakenBy(state, stepKey, fold.readAt) : null;
  if (overtaking !== null) reopen(state, [stepKey], overtaking);
  const change = changeOf(entry.body, content, entry.server.judgement);
  if (!change) return;
  reopen(state, staleSteps(state, stepKey, change), entry.body.id);
  state.changedAt = {
    ...state.changedAt,
    [change.deviceId ?? '']: { at: change.at, entryId: entry.body.id, stepKey },
  };
}

/** Asks for the signatures again that stood before this was recorded. */
function askSignaturesAgain(state: FoldState, body: EntryBody): void {
  const isOlder = (signed: StepFold['signed']): boolean =>
    signed !== null && (signed.deviceId !== body.deviceId || signed.count < body.countOnSequence);
  const keys = Object.entries(state.steps)
    .filter(([, fold]) => fold.counts && fold.reopenedBy === null && isOlder(fold.signed))
    .map(([key]) => key);
  reopen(state, keys, body.id);
}

/** Kept in the chain, but without a place here: what nobody asked must not grow the state of what was asked. */
function isUnknownStep(entry: FoldEntry): boolean {
  return entry.server.judgement?.doubts.some((doubt) => doubt.kind === 'unknownStep') ?? false;
}

function setStep(
  state: FoldState,
  key: string,
  entry: FoldEntry,
  result: Pick<StepFold, 'outcome' | 'counts' | 'overrideStanding' | 'signed' | 'readAt'>,
): void {
  const { id, supersedes, authorId } = entry.body;
  const known = state.steps[key];
  state.steps = {
    ...state.steps,
    [key]: {
      entryId: id,
      ...result,
      answeredTwice: known !== undefined && supersedes !== known.entryId,
      reopenedBy: result.counts ? null : (known?.reopenedBy ?? null),
    },
  };
  addRecorder(state, authorId);
}

function addRecorder(state: FoldState, id: PersonId): void {
  if (!state.recorders.includes(id)) state.recorders = [...state.recorders, id];
}

function addPending(state: FoldState, { id, authorId }: EntryBody, restsOn: readonly RestsOn[]): void {
  const others = state.pending.filter((pending) => pending.authorId !== authorId);
  state.pending = [...others, { entryId: id, authorId, restsOn: [...restsOn] }];
  addRecorder(state, authorId);
}

function applyReview(
  state: FoldState,
  entry: FoldEntry,
  content: Extract<EntryContent, { kind: 'review' }>,
): void {
  const move = transitionFor(state.state, content.verdict);
  if (!move) return;
  state.state = move.to;
  state.round += 1;
  state.pending = [];
  state.approvedHead = content.verdict === 'approved' ? content.headHash : null;
  if (content.verdict !== 'sentBack') return;
  reopen(
    state,
    content.remarks.map((remark) => remark.stepKey),
    entry.body.id,
  );
}

/** Asks steps again that have an answer; the others are open anyway. */
function reopen(state: FoldState, keys: readonly string[], by: EntryId): void {
  if (keys.length === 0) return;
  state.steps = { ...state.steps };
  for (const key of keys) {
    const fold = state.steps[key];
    if (fold) state.steps[key] = { ...fold, reopenedBy: by };
  }
}

function markArrived(state: FoldState, body: EntryBody): void {
  if (body.deviceId === null) return;
  const known = state.arrived[body.deviceId] ?? { upTo: 0, beyond: [] };
  if (body.countOnSequence <= known.upTo || known.beyond.includes(body.countOnSequence)) return;
  const beyond = [...known.beyond, body.countOnSequence].sort((a, b) => a - b);
  let upTo = known.upTo;
  while (beyond[0] === upTo + 1) {
    upTo += 1;
    beyond.shift();
  }
  state.arrived = { ...state.arrived, [body.deviceId]: { upTo, beyond } };
}

/** Whether all that a submission rests on has arrived. */
export function hasArrived(state: FoldState, restsOn: readonly RestsOn[]): boolean {
  return restsOn.every((rest) => (state.arrived[rest.deviceId]?.upTo ?? 0) >= rest.count);
}

/** A submission takes effect as soon as all it rests on is there and nothing is missing; until then it waits. */
function settlePending(state: FoldState, steps: readonly Step[]): void {
  if (!state.pending.some((pending) => hasArrived(state, pending.restsOn))) return;
  const move = transitionFor(state.state, 'submission');
  if (move && missingSteps(state, steps).length === 0) takeEffect(state, move.to);
}

/** The sequence is submitted now, by whoever's submission has all that it rests on. */
function takeEffect(state: FoldState, to: FoldState['state']): void {
  state.state = to;
  if (to !== 'submitted') return;
  const settled = state.pending.find((pending) => hasArrived(state, pending.restsOn)) ?? state.pending.at(-1);
  state.submittedBy = settled?.authorId ?? state.submittedBy;
  state.pending = [];
}
