import { DEFAULT_WAIT_S, type SuperheatStep } from '#shared/checklist/kinds/superheat';
import type { SequenceDetail } from '#shared/contracts/sequences';
import type { SequenceView, StepView } from '#shared/sequences/sequence-view';
import type { Text } from '#shared/checklist/text';
import { figureOf, liveObservation } from '../steps/superheat-live';
import { isBlank, keptSuperheat, type TypedSuperheat } from '../steps/superheat-typed';
import { inOrder, valveWait, type ValveWait } from './valve-wait';
import type { ValveTurn } from '#shared/checklist/kinds/superheat';

/** Where one coil stands: what is in its boxes comes before what was recorded earlier. */
export type CoilState =
  'missing' | 'underWay' | 'waiting' | 'settled' | 'typed' | 'stale' | 'askedAgain' | 'notCounting' | 'done';

/** One coil of the line-up. */
export interface CoilRow {
  readonly stepKey: string;
  readonly title: Text;
  /** As the schedule counts the fixture's coils; `null` for a step of a whole fixture. */
  readonly number: number | null;
  readonly state: CoilState;
  readonly isStale: boolean;
  readonly asFoundK: number | null;
  readonly asLeftK: number | null;
  readonly turns: readonly ValveTurn[];
  /** Of a valve that was turned and isn't recorded yet. */
  readonly wait: ValveWait | null;
  readonly view: StepView;
}

/** One fixture with its coils, in the order of the schedule. */
export interface FixtureRows {
  readonly tag: string;
  readonly description: string;
  readonly rows: readonly CoilRow[];
}

/**
 * The line-up of a circuit: each fixture with its coils as they stand on this phone.
 *
 * @param draftOf what this browser keeps of a step that isn't recorded yet
 * @param nowMs the phone's clock
 */
export function coilLine(
  view: SequenceView,
  detail: SequenceDetail,
  draftOf: (stepKey: string) => unknown,
  nowMs: number,
): readonly FixtureRows[] {
  const steps = view.steps.filter(({ step }) => step.kind === 'superheat');
  const { fixtures } = detail.specification.circuit;
  const rowOf = (one: StepView): CoilRow => coilRow(one, detail, draftOf(one.step.key), nowMs);
  const placed = fixtures.map((fixture) => ({
    tag: fixture.tag,
    description: fixture.description,
    rows: steps.filter(({ step }) => step.fixtureId === fixture.id).map(rowOf),
  }));
  // A step of a fixture that a revised schedule no longer has still stands on the checklist.
  const others = steps.filter(({ step }) => !fixtures.some(({ id }) => id === step.fixtureId)).map(rowOf);
  const rest = others.length > 0 ? [{ tag: '', description: '', rows: others }] : [];
  return [...placed, ...rest].filter(({ rows }) => rows.length > 0);
}

function coilRow(view: StepView, detail: SequenceDetail, kept: unknown, nowMs: number): CoilRow {
  const step = view.step as SuperheatStep;
  const coils = detail.specification.circuit.fixtures.flatMap((fixture) => fixture.coils);
  const draft = begun(keptSuperheat(kept));
  const wait = draft && valveWait(draft.turns, nowMs, step.waitS ?? DEFAULT_WAIT_S);
  const shown = draft ? typedFigures(draft, step, detail) : recordedFigures(view);
  return {
    stepKey: step.key,
    title: step.title,
    number: coils.find(({ id }) => id === step.coilId)?.number ?? null,
    state: draft ? draftState(draft, wait) : recordedState(view),
    isStale: view.again === 'stale',
    wait,
    view,
    ...shown,
  };
}

/** A draft in which something was typed or turned. */
const begun = (draft: TypedSuperheat | null): TypedSuperheat | null =>
  draft && (!isBlank(draft.asFound) || !isBlank(draft.asLeft) || draft.turns.length > 0) ? draft : null;

type Shown = Pick<CoilRow, 'asFoundK' | 'asLeftK' | 'turns'>;

function typedFigures(draft: TypedSuperheat, step: SuperheatStep, { stepList }: SequenceDetail): Shown {
  const superheatK = (look: 'asFound' | 'asLeft'): number | null =>
    figureOf(liveObservation(draft[look], step, stepList.facts, draft), 'superheat');
  return { asFoundK: superheatK('asFound'), asLeftK: superheatK('asLeft'), turns: inOrder(draft.turns) };
}

function recordedFigures({ current }: StepView): Shown {
  const content = current?.body.content;
  if (content?.kind !== 'answer' || content.answer.kind !== 'superheat')
    return { asFoundK: null, asLeftK: null, turns: [] };
  const figures = current?.server.judgement?.figures ?? content.workedOut.figures;
  const named = (label: string): number | null =>
    figures.find((figure) => figure.label === label)?.value ?? null;
  return {
    asFoundK: named('superheatAsFound'),
    asLeftK: named('superheat'),
    turns: inOrder(content.answer.turns ?? []),
  };
}

function draftState(draft: TypedSuperheat, wait: ValveWait | null): CoilState {
  if (!isBlank(draft.asLeft)) return 'typed';
  if (wait) return wait.isOver ? 'settled' : 'waiting';
  return 'underWay';
}

function recordedState({ fold, again }: StepView): CoilState {
  if (!fold) return 'missing';
  if (again === 'stale') return 'stale';
  if (fold.reopenedBy !== null) return 'askedAgain';
  return fold.counts ? 'done' : 'notCounting';
}
