import type { SequenceView } from '#shared/sequences/sequence-view';
import { gap, type Block } from '../../pdf/block';
import { paragraph } from '../../pdf/paragraph';
import { STYLES } from '../../pdf/text-style';
import { say } from './document-context';
import type { CircuitContext } from './judged-entry';

/** The required steps that nobody answered yet, by section, as few lines as it takes; nothing when there are none. */
export function stillOpenBlocks(circuit: CircuitContext, view: SequenceView): Block[] {
  const { context, detail } = circuit;
  const { sheet, words } = context;
  const open = view.steps
    .map(({ step, current }, index) => ({ step, current, number: index + 1 }))
    .filter(({ step, current }) => step.required && current === null);
  if (open.length === 0) return [];
  const titles = new Map(detail.stepList.sections.map(({ key, title }) => [key, say(context, title)]));
  const sections = [...new Set(open.map(({ step }) => step.section))];
  return [
    gap(6),
    ...paragraph(sheet, `${words.stillOpen} (${open.length})`, STYLES.section, { tag: 'H2' }),
    ...sections.flatMap((section) => [
      gap(3),
      ...paragraph(sheet, titles.get(section) ?? section, STYLES.label, { keepWithNext: true }),
      ...paragraph(
        sheet,
        open
          .filter(({ step }) => step.section === section)
          .map(({ step, number }) => `${number}. ${say(context, step.title)}`)
          .join(' · '),
        STYLES.body,
      ),
    ]),
  ];
}
