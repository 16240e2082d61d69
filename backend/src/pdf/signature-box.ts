import { signaturePath, type Signature } from '#shared/checklist/signature';
import type { Block } from './block';
import { COLOURS } from './colours';
import { PAGE } from './page-geometry';
import { baselineOf } from './paragraph';
import type { Sheet } from './sheet';
import { STYLES, type TextStyle } from './text-style';

const BOX_WIDTH = 200;
const BOX_HEIGHT = 54;
const TEXT_X = PAGE.left + BOX_WIDTH + 20;

/** A typed signature: a name set in place of a drawing. */
const TYPED_STYLE: TextStyle = { face: 'medium', size: 15, lead: 20, colour: COLOURS.ink };

/**
 * A signature over its line, with what belongs to it on the right.
 *
 * @param lines printed name first; then capacity, time, meaning
 */
export function signatureBox(
  sheet: Sheet,
  signature: Signature,
  lines: readonly string[],
  alt: string,
): Block {
  const set = lines.flatMap((line, index) =>
    sheet
      .wrap(line, index === 0 ? STYLES.strong : STYLES.small, PAGE.right - TEXT_X)
      .map((text) => ({ text, style: index === 0 ? STYLES.strong : STYLES.small })),
  );
  const textHeight = set.reduce((sum, line) => sum + line.style.lead, 0);
  return {
    height: Math.max(BOX_HEIGHT + 8, textHeight + 8),
    draw: (page, top) => {
      page.tagged('Figure', () => drawSignature(page, signature, top), alt);
      page.tagged('P', () => {
        let y = top + 4;
        for (const line of set) {
          page.text(line.text, TEXT_X, baselineOf(y, line.style), line.style);
          y += line.style.lead;
        }
      });
    },
  };
}

function drawSignature(sheet: Sheet, signature: Signature, top: number): void {
  const { doc } = sheet;
  const base = top + BOX_HEIGHT;
  sheet.line(PAGE.left, base, PAGE.left + BOX_WIDTH, base, COLOURS.rule, 0.8);
  doc.lineWidth(0.8).strokeColor(COLOURS.rule);
  sheet.line(PAGE.left + 2, base - 9, PAGE.left + 8, base - 3, COLOURS.rule, 0.8);
  sheet.line(PAGE.left + 2, base - 3, PAGE.left + 8, base - 9, COLOURS.rule, 0.8);
  if (signature.typed) {
    sheet.text(
      sheet.fitted(signature.printedName, TYPED_STYLE, BOX_WIDTH - 20),
      PAGE.left + 14,
      base - 6,
      TYPED_STYLE,
    );
    return;
  }
  const path = signaturePath(signature);
  if (path === '') return;
  const scale = Math.min((BOX_WIDTH - 14) / signature.width, (BOX_HEIGHT - 2) / signature.height);
  doc.save();
  // A stroke may leave its box on the phone; on paper it stays in.
  doc.rect(PAGE.left, top, BOX_WIDTH, BOX_HEIGHT + 4).clip();
  doc.translate(PAGE.left + 12, top + 1).scale(scale);
  doc
    .lineWidth(1.3 / scale)
    .lineCap('round')
    .lineJoin('round')
    .strokeColor(COLOURS.ink);
  doc.path(path).stroke();
  doc.restore();
}
