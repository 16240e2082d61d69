import { beginCircuitPage, drawCircuit } from './circuit-chapter';
import type { CircuitSource } from './circuit-source';
import { drawContents } from './contents-pages';
import { drawCover } from './cover-page';
import { drawDefrostPlan } from './defrost-pages';
import { chaptersOf, type DocumentContext } from './document-context';
import { drawHashes, type CircuitHash } from './hash-page';
import { drawSummary } from './summary-pages';
import { sourcesOf } from './working-blocks';

/**
 * Draws the whole document, one circuit in memory at a time: the same for measuring and for writing.
 *
 * @param onCircuit called with the number of chapters drawn
 */
export async function drawDocument(
  context: DocumentContext,
  source: Pick<CircuitSource, 'load'>,
  onCircuit: (drawn: number) => void,
): Promise<void> {
  const { sheet } = context;
  await drawCover(context);
  await drawContents(context);
  await drawSummary(context);
  await drawDefrostPlan(context);
  const hashes: CircuitHash[] = [];
  const sources = new Set<string>();
  let systemName: string | null = null;
  let outline = sheet.doc.outline;
  for (const [index, circuit] of chaptersOf(context).entries()) {
    const detail = await source.load(circuit.sequenceId);
    beginCircuitPage(sheet);
    // After the page began: the outline's entry of a system leads to its first circuit.
    if (systemName !== circuit.systemName) {
      systemName = circuit.systemName;
      outline = sheet.doc.outline.addItem(systemName);
    }
    const drawn = await drawCircuit(context, circuit, detail, outline);
    hashes.push({ code: circuit.code, approvedHead: drawn.fold.approvedHead });
    for (const source of sourcesOf(detail.entries)) sources.add(source);
    onCircuit(index + 1);
  }
  await drawHashes(context, hashes, [...sources]);
  sheet.finish();
}
