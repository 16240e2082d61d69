import type { FoldEntry } from '#shared/sequences/fold';
import { unreachable } from '#shared/failures/unreachable';
import type { Verdict } from '#shared/sequences/entry';
import { gap, kept, type Block } from '../../pdf/block';
import { COLOURS } from '../../pdf/colours';
import { drawJoint, type JointState } from '../../pdf/joint';
import { PAGE, TEXT_WIDTH } from '../../pdf/page-geometry';
import { paragraph } from '../../pdf/paragraph';
import { STYLES } from '../../pdf/text-style';
import { say } from './document-context';
import { whoAndWhen, type CircuitContext } from './judged-entry';
import { signedBlock } from './signature-lines';

/** All reviews of a circuit, oldest first: verdict, who and when, remarks, what the signature means. */
export function reviewBlocks(circuit: CircuitContext, reviews: readonly FoldEntry[]): Block[] {
  const { sheet, words } = circuit.context;
  const title = paragraph(sheet, words.reviews, STYLES.section, { tag: 'H2' });
  if (reviews.length === 0) return [gap(10), ...title, ...paragraph(sheet, words.noReview, STYLES.body)];
  return [gap(10), ...title, ...reviews.flatMap((review) => oneReview(circuit, review))];
}

function oneReview(circuit: CircuitContext, entry: FoldEntry): Block[] {
  const { context, detail } = circuit;
  const { sheet, words } = context;
  const { content } = entry.body;
  if (content.kind !== 'review') return [];
  const titles = new Map(detail.stepList.steps.map((step) => [step.key, say(context, step.title)]));
  const remarks = content.remarks.flatMap((remark) =>
    paragraph(sheet, `${titles.get(remark.stepKey) ?? remark.stepKey}: ${remark.text}`, STYLES.body, {
      x: PAGE.left + 12,
      width: TEXT_WIDTH - 12,
    }),
  );
  const colour = content.verdict === 'approved' ? COLOURS.copper : COLOURS.plum;
  const meaning = content.meaning ? say(context, content.meaning) : '';
  return [
    gap(6),
    ...kept(
      [
        ...paragraph(
          sheet,
          words.verdicts[content.verdict],
          { ...STYLES.step, colour },
          {
            tag: 'H3',
            ornament: (page, baseline) =>
              drawJoint(page, PAGE.markX, baseline - 3.5, 4, stateAfter(content.verdict)),
          },
        ),
        ...paragraph(sheet, whoAndWhen(circuit, entry), STYLES.small),
        ...paragraph(sheet, words.reviewedHead(content.headHash), STYLES.monoSmall),
      ],
      content.signature !== null || remarks.length > 0,
    ),
    ...(remarks.length > 0 ? paragraph(sheet, words.remarks, STYLES.label, { keepWithNext: true }) : []),
    ...remarks,
    ...(content.signature
      ? [signedBlock(circuit, entry, content.signature, { capacity: words.signature.asReviewer, meaning })]
      : []),
  ];
}

function stateAfter(verdict: Verdict): JointState {
  switch (verdict) {
    case 'approved':
      return 'approved';
    case 'sentBack':
      return 'sentBack';
    case 'withdrawn':
      return 'submitted';
    default:
      return unreachable(verdict);
  }
}
