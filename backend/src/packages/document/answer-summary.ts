import type { SuperheatObservation, SuperheatPair } from '#shared/checklist/kinds/superheat';
import type { Step } from '#shared/checklist/step';
import { unreachable } from '#shared/failures/unreachable';
import type { FoldEntry } from '#shared/sequences/fold';
import { summarizeMeasurement } from './measurement-blocks';
import { say } from './document-context';
import { judgedOf, type CircuitContext } from './judged-entry';

/**
 * An entry in one line of words, for histories: what was answered, nothing left out but drawings.
 *
 * @param step that it answers; `null` when the checklist no longer has it
 */
export function summarizeEntry(circuit: CircuitContext, entry: FoldEntry, step: Step | null): string {
  const { words } = circuit.context;
  const { content } = entry.body;
  switch (content.kind) {
    case 'answer': {
      const judged = judgedOf(entry);
      const outcome =
        judged === null ? '' : judged.counts ? words.outcomes[judged.outcome] : words.doesNotCount;
      return [outcome, summarizeAnswer(circuit, entry, step)].filter((part) => part !== '').join(': ');
    }
    case 'notApplicable':
      return `${words.outcomes.notApplicable}. ${words.reason} ${content.reason}`;
    case 'submission':
      return words.submission;
    case 'expansion':
      return words.checklistVersion(content.templateKey, content.templateVersion);
    case 'review':
      return [words.verdicts[content.verdict], ...content.remarks.map((remark) => remark.text)].join('. ');
    default:
      return unreachable(content);
  }
}

function summarizeAnswer(circuit: CircuitContext, entry: FoldEntry, step: Step | null): string {
  const { context } = circuit;
  const { words, format } = context;
  const { content } = entry.body;
  if (content.kind !== 'answer') return '';
  const { answer } = content;
  switch (answer.kind) {
    case 'confirm':
      return words.confirmed;
    case 'choose': {
      const option =
        step?.kind === 'choose'
          ? step.options.find((candidate) => candidate.value === answer.value)
          : undefined;
      return option ? say(context, option.label) : answer.value;
    }
    case 'reading':
      return format.typed(answer.value);
    case 'superheat':
      return summarizeSuperheat(circuit, entry);
    case 'measurement':
      return summarizeMeasurement(circuit, entry);
    case 'trend':
      return `${answer.column}, ${words.superheat.log(answer.file.name, answer.file.rows)}`;
    case 'photo':
      return `${words.photo.count(answer.photos.length)}: ${answer.photos.map((photo) => photo.sha256.slice(0, 12)).join(', ')}`;
    case 'note':
      return answer.text;
    case 'override':
      return [words.override[answer.phase], answer.remark].filter((part) => part !== '').join('. ');
    case 'signature':
      return words.signature.alt(answer.signature.printedName);
    default:
      return unreachable(answer);
  }
}

/** The pairs of an observation that stand alone; a series is told by its working. */
function pairsOf(observation: SuperheatObservation): readonly SuperheatPair[] {
  if (observation.valve === 'steady') return [observation.pair];
  return observation.valve === 'hunting' ? [observation.low, observation.high] : [];
}

function summarizeSuperheat(circuit: CircuitContext, entry: FoldEntry): string {
  const { format } = circuit.context;
  const { content } = entry.body;
  if (content.kind !== 'answer' || content.answer.kind !== 'superheat') return '';
  const figure = judgedOf(entry)?.figures.find((candidate) => candidate.label === 'superheat');
  const { asLeft } = content.answer;
  const pairs = pairsOf(asLeft);
  const typed = pairs
    .map((pair) => `${format.typed(pair.pressure)}, ${format.typed(pair.temperature)}`)
    .join('; ');
  const value = figure ? `${format.quantity(figure.value, figure.unit)} ` : '';
  return typed === '' ? value.trim() : `${value}(${typed})`;
}
