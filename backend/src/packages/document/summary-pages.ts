import { gap, kept, type Block } from '../../pdf/block';
import { copperLine } from '../../pdf/copper-line';
import { drawJoint, type JointState } from '../../pdf/joint';
import { paragraph } from '../../pdf/paragraph';
import { ruledTable } from '../../pdf/ruled-table';
import { STYLES } from '../../pdf/text-style';
import { countApproved } from './cover-page';
import { beginChapter, SUMMARY_KEY, subjectOf, type DocumentContext } from './document-context';
import type { SummaryCircuit, SummarySystem } from './package-content';

const ORDER = [
  'approved',
  'submitted',
  'sentBack',
  'underWay',
  'open',
  'noSequence',
] as const satisfies readonly JointState[];

/** Each system's copper line with its counts, then its circuits with their states. */
export async function drawSummary(context: DocumentContext): Promise<void> {
  const { sheet, content, words } = context;
  sheet.newPage();
  sheet.runningHead = words.summary;
  sheet.openPart('Sect');
  beginChapter(context, SUMMARY_KEY, words.summary);
  await sheet.place([...paragraph(sheet, words.summary, STYLES.chapter, { tag: 'H1' }), gap(8)]);
  if (content.summary.systems.length === 0)
    await sheet.place(paragraph(sheet, words.cover.noCircuits, STYLES.body));
  for (const system of content.summary.systems) await sheet.place(systemBlocks(context, system));
  sheet.closePart();
  sheet.runningHead = null;
}

function systemBlocks(context: DocumentContext, system: SummarySystem): Block[] {
  const { sheet, words } = context;
  const { approved, total } = countApproved(system.circuits);
  const counts = ORDER.map((state) => ({
    state,
    count: system.circuits.filter((circuit) => circuit.state === state).length,
  })).filter(({ count }) => count > 0);
  const stepCounts = notBegunIn(context, system);
  const begun = system.circuits.filter((circuit) => !stepCounts.has(circuit));
  const notBegun = system.circuits.filter((circuit) => stepCounts.has(circuit));
  const line = copperLine(system.circuits, words.lineAlt(system.name, approved, total));
  return [
    gap(14),
    ...kept(
      [
        ...paragraph(sheet, `${system.name}, ${system.refrigerant}`, STYLES.section, { tag: 'H2' }),
        ...paragraph(
          sheet,
          [
            words.circuitCount(total),
            ...counts.map(({ state, count }) => `${count} ${words.states[state].toLowerCase()}`),
          ].join(' · '),
          STYLES.small,
        ),
        gap(8),
      ],
      true,
    ),
    ...line,
    gap(6),
    ...workTable(context, system),
    ...circuitTable(context, begun),
    ...(notBegun.length > 0
      ? [
          gap(12),
          ...paragraph(sheet, words.notBegun, STYLES.step, { tag: 'H3' }),
          ...paragraph(sheet, words.notBegunNote, STYLES.small, { keepWithNext: true }),
          { ...gap(4), keepWithNext: true },
          ...circuitTable(context, notBegun, stepCounts),
        ]
      : []),
    gap(10),
  ];
}

/** The own work of a system and its groups, which no circuit's state says anything of. */
function workTable(context: DocumentContext, { work }: SummarySystem): Block[] {
  const { sheet, words } = context;
  if (work.length === 0) return [];
  const columns = [
    { title: words.columns.work, share: 40, style: STYLES.mono },
    { title: '', share: 38 },
    { title: words.columns.state, share: 26 },
  ];
  const rows = work.map(({ level, code, state }) => [
    { text: code },
    { text: subjectOf(context, { level, description: '' }) },
    {
      text: words.states[state],
      mark: (page: typeof sheet, x: number, y: number) => drawJoint(page, x, y, 3.2, state),
    },
  ]);
  return [...ruledTable(sheet, columns, rows, { hasRowHeads: true, padding: 2.5 }), gap(12)];
}

/** The circuits of a system that have a checklist and nothing on it, each with the number of its steps. */
function notBegunIn(context: DocumentContext, system: SummarySystem): ReadonlyMap<SummaryCircuit, number> {
  const { content, survey } = context;
  const found = new Map<SummaryCircuit, number>();
  for (const circuit of system.circuits) {
    const reference = content.circuits.find(
      ({ level, systemName, code }) =>
        level === 'circuit' && systemName === system.name && code === circuit.code,
    );
    const surveyed = reference && survey.get(reference.sequenceId);
    if (surveyed && !surveyed.isBegun) found.set(circuit, surveyed.stepCount);
  }
  return found;
}

/** One line a circuit; with the number of steps where that is all there is to say of its work. */
function circuitTable(
  context: DocumentContext,
  circuits: readonly SummaryCircuit[],
  stepCounts: ReadonlyMap<SummaryCircuit, number> | null = null,
): Block[] {
  const { sheet, words } = context;
  if (circuits.length === 0) return [];
  const columns = [
    { title: words.columns.circuit, share: 16, style: STYLES.mono },
    { title: words.columns.description, share: 40 },
    { title: words.columns.area, share: 22 },
    { title: words.columns.state, share: 26 },
    ...(stepCounts
      ? [{ title: words.columns.steps, share: 10, style: STYLES.mono, align: 'right' as const }]
      : []),
  ];
  const rows = circuits.map((circuit) => [
    { text: circuit.code },
    { text: circuit.description },
    { text: circuit.area },
    {
      text: words.states[circuit.state],
      mark: (page: typeof sheet, x: number, y: number) => drawJoint(page, x, y, 3.2, circuit.state),
    },
    ...(stepCounts ? [{ text: String(stepCounts.get(circuit) ?? '') }] : []),
  ]);
  return ruledTable(sheet, columns, rows, { hasRowHeads: true, padding: 2.5 });
}
