import type { Step } from '#shared/checklist/step';
import type { FoldEntry } from '#shared/sequences/fold';
import { isDone, type StepView } from '#shared/sequences/sequence-view';
import { gap, kept, type Block } from '../../pdf/block';
import { COLOURS } from '../../pdf/colours';
import { drawHatchedEdge } from '../../pdf/hatched-edge';
import { drawOutcomeMark, MARK_COLOURS, type MarkKind } from '../../pdf/outcome-mark';
import { PAGE, TEXT_WIDTH } from '../../pdf/page-geometry';
import { paragraph } from '../../pdf/paragraph';
import { STYLES } from '../../pdf/text-style';
import { answerBlocks } from './answer-blocks';
import { summarizeEntry } from './answer-summary';
import { say } from './document-context';
import { authorOf, judgedOf, whoAndWhen, type CircuitContext } from './judged-entry';
import { sourceInWords } from '#shared/checklist/source-words';
import { DOUBT_WORDS } from '#shared/checklist/words/doubt-words';

const OUTCOME_ROOM = 150;

/** A step up to this height stands on one page; a taller one would leave too much of a page empty. */
const KEPT_WHOLE = 170;

interface Standing {
  readonly mark: MarkKind;
  readonly side: 'low' | 'high' | null;
  readonly word: string;
}

/** One step: its outcome, what was recorded, by whom and when, and what stood there before. */
export function stepBlocks(circuit: CircuitContext, view: StepView, number: number): Block[] {
  const { context } = circuit;
  const { sheet, words } = context;
  const { step, current, history } = view;
  const standing = standingOf(circuit, view);
  const head: Block[] = [
    ...paragraph(sheet, `${number}. ${say(context, step.title)}`, STYLES.step, {
      tag: 'H4',
      width: TEXT_WIDTH - OUTCOME_ROOM,
      ornament: (page, baseline) => {
        drawOutcomeMark(page, PAGE.markX, baseline - STYLES.step.size * 0.33, standing.mark, standing.side);
      },
      aside: {
        text: standing.word,
        style: { ...STYLES.strong, colour: MARK_COLOURS[standing.mark] },
      },
    }),
    ...placeAndInstruction(circuit, step),
  ];
  const answer = current ? answerBlocks(circuit, step, current, history) : [];
  const [firstAnswer, ...otherAnswer] = answer;
  const body: Block[] = [
    ...(firstAnswer ? [firstAnswer, ...otherAnswer] : []),
    ...(current ? notices(circuit, view, current) : []),
    ...(current && step.kind !== 'override' && step.kind !== 'signature'
      ? paragraph(sheet, whoAndWhen(circuit, current), STYLES.small)
      : []),
    ...remarkBlocks(circuit, view),
    ...(step.kind === 'override' ? [] : earlierBlocks(circuit, history.slice(0, -1), step, words.earlier)),
  ];
  const height = [...head, ...body].reduce((sum, block) => sum + block.height, 0);
  const whole = height <= KEPT_WHOLE ? kept([...head, ...body]) : [...kept(head, body.length > 0), ...body];
  return [...whole, gap(12)];
}

function standingOf(circuit: CircuitContext, view: StepView): Standing {
  const { words } = circuit.context;
  const { fold, current } = view;
  const waiting = (word: string): Standing => ({ mark: 'waiting', side: null, word });
  if (!fold || !current) return waiting(words.outcomes.waiting);
  if (fold.reopenedBy !== null) return waiting(words.askedAgain);
  if (fold.overrideStanding) return waiting(words.override.standing);
  if (!isDone(fold)) return waiting(words.doesNotCount);
  const side = judgedOf(current)?.side ?? null;
  const word = fold.outcome === 'outside' && side !== null ? words.sides[side] : words.outcomes[fold.outcome];
  return { mark: fold.outcome, side, word };
}

function placeAndInstruction(circuit: CircuitContext, step: Step): Block[] {
  const { context, detail } = circuit;
  const { sheet, words } = context;
  const fixture = detail.specification.circuit.fixtures.find((candidate) => candidate.id === step.fixtureId);
  const coil = fixture?.coils.find((candidate) => candidate.id === step.coilId);
  const place = [fixture?.tag, coil && words.coil(coil.number)]
    .filter((part) => part !== undefined)
    .join(', ');
  const instruction = step.instruction ? say(context, step.instruction) : '';
  const line = [place, instruction].filter((part) => part !== '').join(' · ');
  return line === '' ? [gap(2)] : [...paragraph(sheet, line, STYLES.small), gap(2)];
}

/** What deserves a second look, behind a hatched edge; and where the criterion comes from. */
function notices(circuit: CircuitContext, view: StepView, current: FoldEntry): Block[] {
  const { sheet, words } = circuit.context;
  const judged = judgedOf(current);
  const cautions = (judged?.doubts ?? []).map((doubt) => say(circuit.context, DOUBT_WORDS[doubt.kind]));
  if (view.fold?.answeredTwice) cautions.push(words.answeredTwice);
  const source = judged?.limit?.source ?? '';
  return [
    ...cautions.flatMap((caution) => cautionBlocks(circuit, caution)),
    ...(source === ''
      ? []
      : paragraph(sheet, words.criterion(sourceInWords(source, circuit.context.language)), STYLES.small)),
  ];
}

function cautionBlocks(circuit: CircuitContext, caution: string): Block[] {
  const { sheet } = circuit.context;
  const lines = paragraph(sheet, caution, STYLES.caution, { x: PAGE.left + 12, width: TEXT_WIDTH - 12 });
  return kept(
    lines.map((line) => ({
      ...line,
      draw: (page, top) => {
        page.artifact(() => drawHatchedEdge(page, PAGE.left, top, line.height));
        line.draw(page, top);
      },
    })),
  );
}

function remarkBlocks(circuit: CircuitContext, view: StepView): Block[] {
  const { sheet, words } = circuit.context;
  if (!view.remark) return [];
  const said = `${words.reopened(authorOf(circuit, view.remark.entry))} ${view.remark.text}`;
  return paragraph(sheet, said, { ...STYLES.body, colour: COLOURS.plum });
}

/** Entries told small, oldest first: what a later entry took the place of, and what never became part of the record. */
export function earlierBlocks(
  circuit: CircuitContext,
  entries: readonly FoldEntry[],
  step: Step | null,
  title: string,
): Block[] {
  const { sheet } = circuit.context;
  if (entries.length === 0) return [];
  const place = { x: PAGE.left + 12, width: TEXT_WIDTH - 12 };
  return [
    gap(2),
    ...paragraph(sheet, title, STYLES.label, { ...place, keepWithNext: true }),
    ...entries.flatMap((entry) =>
      paragraph(
        sheet,
        `${summarizeEntry(circuit, entry, step)} (${whoAndWhen(circuit, entry)})`,
        STYLES.small,
        place,
      ),
    ),
  ];
}
