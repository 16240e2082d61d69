import { gap, type Block } from '../../pdf/block';
import { COLOURS } from '../../pdf/colours';
import { factGrid } from '../../pdf/fact-grid';
import { drawJoint, type JointState } from '../../pdf/joint';
import { openingLine } from '../../pdf/opening-line';
import { PAGE, TEXT_WIDTH } from '../../pdf/page-geometry';
import { baselineOf, paragraph } from '../../pdf/paragraph';
import { STYLES, type TextStyle } from '../../pdf/text-style';
import type { DocumentContext } from './document-context';
import type { PackageContent, SummaryCircuit } from './package-content';

/** The order in which circuits that aren't approved are listed: the nearest to done first. */
const UNFINISHED = [
  'submitted',
  'sentBack',
  'underWay',
  'open',
  'noSequence',
] as const satisfies readonly JointState[];

const PRODUCT = 'Firstcold';

const BIG_COUNT: TextStyle = { face: 'strong', size: 17, lead: 24, colour: COLOURS.ink };

/** The first page: whose store, which version, and what is and isn't complete. */
export async function drawCover(context: DocumentContext): Promise<void> {
  const { sheet, content, words, format } = context;
  const { opening } = content;
  sheet.newPage();
  sheet.openPart('Sect');
  await sheet.place([
    wordMark(),
    gap(78),
    ...paragraph(sheet, `${words.title} · ${words.version(content.package.version)}`, STYLES.lead),
    gap(4),
    ...paragraph(sheet, opening.name, STYLES.display, { tag: 'H1' }),
    ...paragraph(sheet, opening.address, STYLES.lead),
    gap(22),
    wholeLine(context),
    gap(18),
    ...factGrid(
      sheet,
      [
        { label: words.cover.openingDate, value: format.day(opening.openingDate) },
        { label: words.cover.contractor, value: opening.contractorName },
        { label: words.cover.company, value: opening.companyName },
        {
          label: words.cover.built,
          value: words.cover.builtBy(
            format.dateTime(content.package.createdAt),
            content.package.createdByName,
          ),
        },
        { label: words.cover.elevation, value: format.wholeLength(opening.elevationM) },
        { label: words.cover.units, value: words.cover.unitSystems[opening.unitSystem] },
      ],
      2,
    ),
    gap(8),
    // Before the list of circuits, which may be long: this sentence belongs on the first page.
    ...paragraph(sheet, words.cover.standsAbove, STYLES.small),
    gap(24),
    ...completeness(context),
  ]);
  sheet.closePart();
}

function wordMark(): Block {
  return {
    height: 20,
    draw: (sheet, top) => {
      const baseline = baselineOf(top, STYLES.lead);
      sheet.artifact(() => {
        sheet.line(PAGE.left, baseline - 4, PAGE.left + 26, baseline - 4, COLOURS.copperLine, 3);
        drawJoint(sheet, PAGE.left + 13, baseline - 4, 4, 'approved');
      });
      sheet.tagged('P', () =>
        sheet.text(PRODUCT, PAGE.left + 34, baseline, { ...STYLES.lead, face: 'medium' }),
      );
    },
  };
}

const circuitsOf = (content: PackageContent): readonly SummaryCircuit[] =>
  content.summary.systems.flatMap((system) => system.circuits);

/** How many of how many circuits are approved. */
export function countApproved(circuits: readonly SummaryCircuit[]): { approved: number; total: number } {
  return {
    approved: circuits.filter((circuit) => circuit.state === 'approved').length,
    total: circuits.length,
  };
}

/** The whole opening as one copper line: what each system has approved of all that it has. */
function wholeLine(context: DocumentContext): Block {
  const { content, words } = context;
  const { approved, total } = countApproved(circuitsOf(content));
  const segments = content.summary.systems.map(({ name, circuits }) => ({
    name,
    ...countApproved(circuits),
  }));
  return openingLine(segments, words.lineAlt(content.opening.name, approved, total));
}

function completeness(context: DocumentContext): Block[] {
  const { sheet, content, words } = context;
  const circuits = circuitsOf(content);
  const { approved, total } = countApproved(circuits);
  if (total === 0) return paragraph(sheet, words.cover.noCircuits, STYLES.lead);
  const work = content.summary.systems
    .flatMap((system) => system.work)
    .filter(({ state }) => state !== 'approved');
  const isComplete = approved === total && work.length === 0;
  const blocks = [
    ...paragraph(sheet, words.cover.approvedCount(approved, total), BIG_COUNT, { tag: 'H2' }),
    ...paragraph(sheet, isComplete ? words.cover.complete : words.cover.incomplete, STYLES.body),
  ];
  for (const state of UNFINISHED) {
    const codes = circuits.filter((circuit) => circuit.state === state).map((circuit) => circuit.code);
    if (codes.length === 0) continue;
    blocks.push(
      { ...gap(8), keepWithNext: true },
      ...paragraph(sheet, `${words.states[state]}, ${words.circuitCount(codes.length)}`, STYLES.label, {
        x: PAGE.left + 20,
        width: TEXT_WIDTH - 20,
        keepWithNext: true,
        ornament: (page, baseline) => drawJoint(page, PAGE.left + 6, baseline - 3, 3.6, state),
      }),
      ...paragraph(sheet, codes.join(', '), STYLES.mono, { x: PAGE.left + 20, width: TEXT_WIDTH - 20 }),
    );
  }
  if (work.length > 0) {
    const list = work.map(({ code, state }) => `${code} (${words.states[state].toLowerCase()})`).join(', ');
    blocks.push(
      { ...gap(8), keepWithNext: true },
      ...paragraph(sheet, words.cover.workNotApproved, STYLES.label, {
        x: PAGE.left + 20,
        width: TEXT_WIDTH - 20,
        keepWithNext: true,
      }),
      ...paragraph(sheet, list, STYLES.mono, { x: PAGE.left + 20, width: TEXT_WIDTH - 20 }),
    );
  }
  return blocks;
}
