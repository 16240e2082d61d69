import type { Step } from '#shared/checklist/step';
import { unreachable } from '#shared/failures/unreachable';
import type { FoldEntry } from '#shared/sequences/fold';
import { gap, type Block } from '../../pdf/block';
import { paragraph } from '../../pdf/paragraph';
import { photoRows } from '../../pdf/photo-row';
import { STYLES } from '../../pdf/text-style';
import { summarizeEntry } from './answer-summary';
import { say } from './document-context';
import { whoAndWhen, type CircuitContext } from './judged-entry';
import { measurementBlocks } from './measurement-blocks';
import { photoPlates } from './photo-plates';
import { readingBlocks } from './reading-blocks';
import { signedBlock } from './signature-lines';
import { superheatBlocks } from './superheat-blocks';
import { trendBlocks } from './trend-blocks';

/** What stands on a step now, drawn in the way of its kind. */
export function answerBlocks(
  circuit: CircuitContext,
  step: Step,
  entry: FoldEntry,
  history: readonly FoldEntry[],
): Block[] {
  const { context } = circuit;
  const { sheet, words } = context;
  const { content } = entry.body;
  if (content.kind === 'notApplicable')
    return paragraph(sheet, `${words.reason} ${content.reason}`, STYLES.body);
  if (content.kind !== 'answer') return [];
  const { answer } = content;
  // An answer of another kind than the step's: kept, and told as it is.
  if (answer.kind !== step.kind) return paragraph(sheet, summarizeEntry(circuit, entry, step), STYLES.body);
  switch (step.kind) {
    case 'confirm':
      return paragraph(sheet, words.confirmed, STYLES.body);
    case 'choose':
      return paragraph(sheet, optionLabel(circuit, step, entry), STYLES.strong);
    case 'reading':
      return readingBlocks(circuit, entry, step);
    case 'superheat':
      return superheatBlocks(circuit, entry, step);
    case 'measurement':
      return measurementBlocks(circuit, entry, step);
    case 'trend':
      return trendBlocks(circuit, entry, step);
    case 'photo':
      if (answer.kind !== 'photo') return [];
      return [
        { ...gap(4), keepWithNext: true },
        ...photoRows(sheet, photoPlates(circuit, answer.photos, say(context, step.title))),
      ];
    case 'note':
      return answer.kind === 'note' ? paragraph(sheet, answer.text, STYLES.body) : [];
    case 'override':
      return overrideBlocks(circuit, history);
    case 'signature':
      if (answer.kind !== 'signature') return [];
      return [
        signedBlock(circuit, entry, answer.signature, {
          capacity: words.signature.asRecorder,
          meaning: say(context, step.meaning),
        }),
      ];
    default:
      return unreachable(step);
  }
}

function optionLabel(
  circuit: CircuitContext,
  step: Extract<Step, { kind: 'choose' }>,
  entry: FoldEntry,
): string {
  const { content } = entry.body;
  if (content.kind !== 'answer' || content.answer.kind !== 'choose') return '';
  const { value } = content.answer;
  const option = step.options.find((candidate) => candidate.value === value);
  return option ? say(circuit.context, option.label) : value;
}

/** An override is told in full: every time it was set and every time it was put back. */
function overrideBlocks(circuit: CircuitContext, history: readonly FoldEntry[]): Block[] {
  const { sheet, words } = circuit.context;
  return history.flatMap((entry) => {
    const { content } = entry.body;
    if (content.kind !== 'answer' || content.answer.kind !== 'override') return [];
    const { phase, remark } = content.answer;
    const line = `${words.override[phase]}: ${whoAndWhen(circuit, entry)}`;
    return paragraph(sheet, remark === '' ? line : `${line}. ${remark}`, STYLES.body);
  });
}
