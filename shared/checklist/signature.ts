import * as z from 'zod/mini';

const MAX_STROKES = 200;
const MAX_NUMBERS_PER_STROKE = 4000;

/**
 * A signature as drawn, in strokes of x, y, x, y … on a box of the given size, so that it prints as lines at any size;
 * or typed, for hands that can't draw (WCAG 2.2, 2.5.7). The printed name stands beside either.
 */
export const signatureSchema = z.object({
  printedName: z.string().check(z.minLength(1), z.maxLength(120)),
  width: z.int().check(z.gte(1), z.lte(4000)),
  height: z.int().check(z.gte(1), z.lte(4000)),
  strokes: z
    .array(z.array(z.number().check(z.gte(-4000), z.lte(8000))).check(z.maxLength(MAX_NUMBERS_PER_STROKE)))
    .check(z.maxLength(MAX_STROKES)),
  typed: z.boolean(),
});
export type Signature = z.infer<typeof signatureSchema>;

/** Whether something was drawn, or the name was typed in place of a drawing. */
export function isSigned(signature: Signature): boolean {
  return signature.typed || signature.strokes.some((stroke) => stroke.length >= 4);
}

/** Whether it is this person's: drawn, or typed as exactly the name (letters' case and spaces apart). */
export function isSignedBy(signature: Signature, name: string): boolean {
  const plain = (text: string): string => text.normalize('NFKC').replace(/\s+/g, ' ').trim().toLowerCase();
  return isSigned(signature) && (!signature.typed || plain(signature.printedName) === plain(name));
}

/**
 * The strokes as an SVG path, the same on the screen and in the PDF.
 *
 * @returns an empty string for a typed signature
 */
export function signaturePath(signature: Signature): string {
  return signature.strokes
    .filter((stroke) => stroke.length >= 2)
    .map((stroke) => {
      const points: string[] = [];
      for (let index = 0; index + 1 < stroke.length; index += 2)
        points.push(`${stroke[index]} ${stroke[index + 1]}`);
      return points.length === 1 ? `M${points[0]}l0.1 0` : `M${points.join('L')}`;
    })
    .join('');
}
