import { gap, kept, type Block } from '../../pdf/block';
import { paragraph } from '../../pdf/paragraph';
import { PAGE, TEXT_WIDTH } from '../../pdf/page-geometry';
import { ruledTable } from '../../pdf/ruled-table';
import { STYLES } from '../../pdf/text-style';
import { beginChapter, HASHES_KEY, type DocumentContext } from './document-context';

export interface CircuitHash {
  readonly code: string;
  /** Head that the standing approval answers for; `null` where none does. */
  readonly approvedHead: string | null;
}

/**
 * The last pages: the hash of every approved record, the key's fingerprint, how anyone can check both, and the literature
 * behind the workings.
 */
export async function drawHashes(
  context: DocumentContext,
  hashes: readonly CircuitHash[],
  sources: readonly string[],
): Promise<void> {
  const { sheet, words, content } = context;
  sheet.newPage();
  sheet.runningHead = words.hashPage;
  sheet.openPart('Sect');
  beginChapter(context, HASHES_KEY, words.hashPage);
  const inset = { x: PAGE.left + 20, width: TEXT_WIDTH - 20 };
  await sheet.place([
    ...paragraph(sheet, words.hashPage, STYLES.chapter, { tag: 'H1' }),
    gap(6),
    ...paragraph(sheet, words.hash.intro, STYLES.body),
    gap(12),
    ...kept([
      ...paragraph(sheet, words.hash.fingerprint, STYLES.label),
      ...paragraph(sheet, content.installation.fingerprint, STYLES.mono),
    ]),
    gap(14),
    ...paragraph(sheet, words.hash.howTo, STYLES.section, { tag: 'H2' }),
    ...words.hash.steps.flatMap((step, index) => [
      gap(3),
      ...paragraph(sheet, step, STYLES.body, {
        ...inset,
        ornament: (page, baseline) => page.text(`${index + 1}`, PAGE.left, baseline, STYLES.mono),
      }),
    ]),
    gap(16),
  ]);
  const rows = hashes.map(({ code, approvedHead }) => [
    { text: code, style: STYLES.mono },
    approvedHead === null ? { text: words.hash.notApproved, style: STYLES.small } : { text: approvedHead },
  ]);
  const columns = [
    { title: words.columns.circuit, share: 22 },
    {
      title: words.columns.approvedHead,
      share: 78,
      style: { ...STYLES.monoSmall, colour: STYLES.mono.colour },
    },
  ];
  if (rows.length > 0) await sheet.place(ruledTable(sheet, columns, rows, { hasRowHeads: true }));
  await sheet.place(sourceBlocks(context, sources));
  sheet.closePart();
  sheet.runningHead = null;
}

function sourceBlocks(context: DocumentContext, sources: readonly string[]): Block[] {
  const { sheet, words } = context;
  if (sources.length === 0) return [];
  return [
    gap(20),
    ...paragraph(sheet, words.superheat.sources, STYLES.section, { tag: 'H2' }),
    ...sources.flatMap((source) => [gap(3), ...paragraph(sheet, source, STYLES.small)]),
  ];
}
