import type { SequenceDetail } from '#shared/contracts/sequences';
import type { FoldEntry } from '#shared/sequences/fold';
import { viewSequence, type SequenceView } from '#shared/sequences/sequence-view';
import { gap, kept, type Block } from '../../pdf/block';
import { factGrid } from '../../pdf/fact-grid';
import { drawJoint } from '../../pdf/joint';
import { PAGE, TEXT_WIDTH } from '../../pdf/page-geometry';
import { baselineOf, hairline, paragraph } from '../../pdf/paragraph';
import { COLOURS } from '../../pdf/colours';
import type { Sheet } from '../../pdf/sheet';
import { STYLES, type TextStyle } from '../../pdf/text-style';
import { beginChapter, circuitKey, say, subjectOf, type DocumentContext } from './document-context';
import { circuitContext, type CircuitContext } from './judged-entry';
import type { PackageCircuitRef } from './package-content';
import { reviewBlocks } from './review-blocks';
import { specificationBlocks } from './specification-blocks';
import { earlierBlocks, stepBlocks } from './step-blocks';
import { stillOpenBlocks } from './still-open-blocks';

/** The rest of the line is the state's. */
const CODE_ROOM = TEXT_WIDTH - 150;

/** Turns to the page on which a circuit's chapter begins. */
export function beginCircuitPage(sheet: Sheet): void {
  sheet.hasMarginRule = true;
  sheet.newPage();
}

/**
 * One circuit's chapter, on a page that has begun: what was specified, every step with all that was recorded on it, and the reviews.
 *
 * @returns the folded sequence, for the page of hashes
 */
export async function drawCircuit(
  context: DocumentContext,
  reference: PackageCircuitRef,
  detail: SequenceDetail,
  outline: PDFKit.PDFOutline,
): Promise<SequenceView> {
  const { sheet } = context;
  const view = viewSequence(detail.stepList, detail.entries);
  const circuit = circuitContext(context, detail);
  sheet.runningHead = [reference.code, subjectOf(context, reference)]
    .filter((part) => part !== '')
    .join(' · ');
  sheet.openPart('Sect');
  beginChapter(context, circuitKey(reference.sequenceId), sheet.runningHead, outline);
  await sheet.place(headBlocks(context, reference, detail, view));
  await sheet.place([...specificationBlocks(context, detail.specification), gap(18)]);
  await drawSteps(circuit, view);
  await sheet.place(stillOpenBlocks(circuit, view));
  await sheet.place(asideBlocks(circuit, view));
  await sheet.place(reviewBlocks(circuit, view.reviews));
  sheet.closePart();
  sheet.hasMarginRule = false;
  sheet.runningHead = null;
  return view;
}

function headBlocks(
  context: DocumentContext,
  reference: PackageCircuitRef,
  detail: SequenceDetail,
  view: SequenceView,
): Block[] {
  const { sheet, words } = context;
  const { template } = detail.stepList;
  const { circuit } = detail.specification;
  return [
    {
      height: STYLES.code.lead,
      keepWithNext: true,
      draw: (page, top) => {
        const baseline = baselineOf(top, STYLES.code);
        const word = words.states[reference.state];
        const style = codeStyle(page, reference.code);
        page.tagged('H1', () =>
          page.text(page.fitted(reference.code, style, CODE_ROOM), PAGE.left, baseline, style),
        );
        page.tagged('P', () => page.text(word, PAGE.right, baseline, STYLES.strong, 'right'));
        const width = page.width(page.printable(word, 'medium'), STYLES.strong);
        page.artifact(() => drawJoint(page, PAGE.right - width - 13, baseline - 3.5, 4.6, reference.state));
      },
    },
    ...paragraph(sheet, subjectOf(context, reference), STYLES.lead),
    gap(6),
    hairline(COLOURS.copperLine, PAGE.left, 2),
    ...factGrid(
      sheet,
      [
        {
          label: words.facts.checklist,
          value: words.checklistVersion(say(context, template.title), template.version),
        },
        ...(reference.level === 'circuit' ? [{ label: words.facts.area, value: circuit.area }] : []),
        { label: words.facts.steps, value: words.stepsDone(view.doneCount, view.steps.length) },
        { label: words.facts.outside, value: String(view.outsideCount) },
      ],
      4,
    ),
    gap(16),
  ];
}

/** A circuit's code as large as it fits: it is what people call out across a store, so it is never cut for its size. */
function codeStyle(sheet: Sheet, code: string): TextStyle {
  const width = sheet.width(sheet.printable(code, STYLES.code.face), STYLES.code);
  if (width <= CODE_ROOM) return STYLES.code;
  return { ...STYLES.code, size: Math.max(12, (STYLES.code.size * CODE_ROOM) / width) };
}

async function drawSteps(circuit: CircuitContext, view: SequenceView): Promise<void> {
  const { context, detail } = circuit;
  const { sheet } = context;
  const numbered = view.steps.map((step, index) => ({ step, number: index + 1 }));
  const known = new Set(detail.stepList.sections.map((section) => section.key));
  const sections = [
    ...detail.stepList.sections.map((section) => ({ key: section.key, title: say(context, section.title) })),
    // Steps of a section that the list doesn't name are still steps.
    ...[...new Set(view.steps.map(({ step }) => step.section))]
      .filter((key) => !known.has(key))
      .map((key) => ({ key, title: key })),
  ];
  for (const section of sections) {
    // A step that nobody answered has nothing to show; one that is required is named once, among those still open.
    const steps = numbered.filter(({ step }) => step.step.section === section.key && step.current !== null);
    for (const [index, { step, number }] of steps.entries()) {
      const head = index === 0 ? sectionHead(circuit, section.title) : [];
      await sheet.place([...head, ...stepBlocks(circuit, step, number)]);
    }
  }
}

function sectionHead(circuit: CircuitContext, title: string): Block[] {
  const { sheet } = circuit.context;
  return kept(
    [gap(4), ...paragraph(sheet, title, STYLES.section, { tag: 'H2' }), hairline(COLOURS.rule), gap(8)],
    true,
  );
}

/** What was recorded but is not, or no longer, part of a step: told in full, so that nothing goes unsaid. */
function asideBlocks(circuit: CircuitContext, view: SequenceView): Block[] {
  const { words } = circuit.context;
  const held = circuit.detail.entries.filter((entry) => entry.server.standing === 'held');
  return [
    ...asidePart(circuit, view.noLongerAsked, words.noLongerAsked, words.noLongerAskedNote),
    ...asidePart(circuit, view.late, words.late, words.lateNote),
    ...asidePart(circuit, held, words.held, words.heldNote),
  ];
}

function asidePart(
  circuit: CircuitContext,
  entries: readonly FoldEntry[],
  title: string,
  note: string,
): Block[] {
  const { context, detail } = circuit;
  const { sheet } = context;
  if (entries.length === 0) return [];
  const steps = new Map(detail.stepList.steps.map((step) => [step.key, step]));
  return [
    gap(6),
    ...paragraph(sheet, title, STYLES.section, { tag: 'H2' }),
    ...paragraph(sheet, note, STYLES.small, { keepWithNext: true }),
    ...entries.flatMap((entry) => {
      const { content } = entry.body;
      const key =
        content.kind === 'answer' || content.kind === 'notApplicable' ? content.stepKey : content.kind;
      const step = steps.get(key) ?? null;
      return earlierBlocks(circuit, [entry], step, step ? say(context, step.title) : key);
    }),
  ];
}
