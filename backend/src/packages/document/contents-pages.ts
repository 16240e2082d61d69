import { gap, type Block } from '../../pdf/block';
import { COLOURS } from '../../pdf/colours';
import { drawJoint } from '../../pdf/joint';
import { PAGE, TEXT_WIDTH } from '../../pdf/page-geometry';
import { baselineOf, paragraph } from '../../pdf/paragraph';
import { STYLES } from '../../pdf/text-style';
import { SECTION_WORDS } from './defrost-section-words';
import {
  chaptersOf,
  circuitKey,
  DEFROST_KEY,
  HASHES_KEY,
  say,
  subjectOf,
  SUMMARY_KEY,
  type DocumentContext,
} from './document-context';
import type { PackageCircuitRef } from './package-content';

const ROW_HEIGHT = 17;
const CODE_WIDTH = 78;
/** Names of racks and groups are longer than codes, and what stands after them is one word. */
const LEVEL_CODE_WIDTH = 190;
/** Where the state's joint begins, from the left margin. */
const SUBJECT_RIGHT = CODE_WIDTH + 232;

/** The contents: every chapter with its page, as links. */
export async function drawContents(context: DocumentContext): Promise<void> {
  const { sheet, words } = context;
  sheet.newPage();
  sheet.runningHead = words.contents;
  sheet.openPart('TOC');
  await sheet.place([...paragraph(sheet, words.contents, STYLES.chapter, { tag: 'H1' }), gap(10)]);
  await sheet.place([plainRow(context, SUMMARY_KEY, words.summary)]);
  if (context.content.defrostPlan)
    await sheet.place([plainRow(context, DEFROST_KEY, say(context, SECTION_WORDS.title))]);
  let system: string | null = null;
  for (const circuit of chaptersOf(context)) {
    const rows: Block[] = [];
    if (circuit.systemName !== system) {
      rows.push(gap(8), ...paragraph(sheet, circuit.systemName, STYLES.label, { keepWithNext: true }));
      system = circuit.systemName;
    }
    rows.push(circuitRow(context, circuit));
    await sheet.place(rows);
  }
  await sheet.place([gap(8), plainRow(context, HASHES_KEY, words.hashPage)]);
  sheet.closePart();
  sheet.runningHead = null;
}

function plainRow(context: DocumentContext, key: string, title: string): Block {
  return row(context, key, (top) => {
    const { sheet } = context;
    sheet.text(
      sheet.fitted(title, STYLES.body, TEXT_WIDTH - 50),
      PAGE.left,
      baselineOf(top, STYLES.body),
      STYLES.body,
    );
  });
}

function circuitRow(context: DocumentContext, circuit: PackageCircuitRef): Block {
  return row(context, circuitKey(circuit.sequenceId), (top) => {
    const { sheet, words } = context;
    const baseline = baselineOf(top, STYLES.body);
    const codeRoom = circuit.level === 'circuit' ? CODE_WIDTH : LEVEL_CODE_WIDTH;
    sheet.text(sheet.fitted(circuit.code, STYLES.mono, codeRoom - 8), PAGE.left, baseline, STYLES.mono);
    const x = PAGE.left + codeRoom;
    const subject = sheet.fitted(subjectOf(context, circuit), STYLES.body, SUBJECT_RIGHT - codeRoom);
    sheet.text(subject, x, baseline, STYLES.body);
    sheet.text(words.states[circuit.state], PAGE.right - 130, baseline, STYLES.small);
    drawJoint(sheet, PAGE.right - 142, baseline - 3, 3.2, circuit.state);
  });
}

function row(context: DocumentContext, key: string, drawTitle: (top: number) => void): Block {
  const page = context.knownPages.get(key);
  return {
    height: ROW_HEIGHT,
    draw: (sheet, top) => {
      sheet.tagged('TOCI', () => {
        drawTitle(top + 1);
        const number = page === undefined ? '' : String(page);
        sheet.text(number, PAGE.right, baselineOf(top + 1, STYLES.body), STYLES.mono, 'right');
      });
      sheet.artifact(() =>
        sheet.line(
          PAGE.left,
          top + ROW_HEIGHT - 0.5,
          PAGE.right,
          top + ROW_HEIGHT - 0.5,
          COLOURS.faintRule,
          0.5,
        ),
      );
      sheet.doc.goTo(PAGE.left, top, TEXT_WIDTH, ROW_HEIGHT, key);
    },
  };
}
