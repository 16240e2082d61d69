import type { Signature } from '#shared/checklist/signature';

const MAX_STROKES = 200;
const MAX_NUMBERS = 4000;

type Point = { readonly x: number; readonly y: number };

/**
 * What the pad recorded, as the strokes that are stored: whole pixels of the box, neighbours that fall on the same pixel
 * once, and no more than the contract allows.
 */
export function toStrokes(groups: readonly { readonly points: readonly Point[] }[]): number[][] {
  return groups.slice(0, MAX_STROKES).map(({ points }) => {
    const stroke: number[] = [];
    for (const point of points) {
      const x = Math.round(point.x);
      const y = Math.round(point.y);
      if (stroke.at(-2) === x && stroke.at(-1) === y) continue;
      if (stroke.length >= MAX_NUMBERS) break;
      stroke.push(x, y);
    }
    return stroke;
  });
}

/** Stored strokes as points again, so that a box that was resized or shown anew draws what was there. */
export function toPoints(signature: Signature): { x: number; y: number }[][] {
  return signature.strokes.map((stroke) => {
    const points: { x: number; y: number }[] = [];
    for (let index = 0; index + 1 < stroke.length; index += 2) {
      points.push({ x: stroke[index] ?? 0, y: stroke[index + 1] ?? 0 });
    }
    return points;
  });
}

/**
 * Whether a typed name stands for the printed one. Accents, capitals and doubled spaces don't matter: gloves and foreign
 * keyboards are no reason not to be able to sign.
 */
export function isSameName(typed: string, printed: string): boolean {
  const plain = (name: string): string =>
    name.normalize('NFD').replace(/\p{M}/gu, '').trim().replace(/\s+/g, ' ').toLowerCase();
  return plain(typed) !== '' && plain(typed) === plain(printed);
}
