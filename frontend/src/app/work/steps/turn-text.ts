import type { ValveTurn } from '#shared/checklist/kinds/superheat';
import { formatNumber } from '#shared/units/format';
import { parseNumber } from '#shared/units/parse-number';
import type { Language } from '#shared/checklist/text';

/** Sizes that are turned by feel, in turns of the stem, and how they are written. */
export const TURN_SIZES = [
  { turns: 0.125, sign: '⅛', words: 'eighth' },
  { turns: 0.25, sign: '¼', words: 'quarter' },
  { turns: 0.5, sign: '½', words: 'half' },
  { turns: 1, sign: '1', words: 'whole' },
] as const;

/** The most that an entry takes as one turn. */
const MOST_TURNS = 20;

/** A size as it is written: ⅛, ¼, ½ and 1 as such, any other as a number. */
export function turnSign(turns: number, language: Language): string {
  return TURN_SIZES.find((size) => size.turns === turns)?.sign ?? formatNumber(turns, 2, language);
}

/** A typed size in turns; `null` when it is none. */
export function readTurns(text: string): number | null {
  const parsed = parseNumber(text);
  return parsed.ok && parsed.value > 0 && parsed.value <= MOST_TURNS ? parsed.value : null;
}

/** An arrow of the way in which a turn went. */
export const turnArrow = ({ direction }: Pick<ValveTurn, 'direction'>): string =>
  direction === 'clockwise' ? '↻' : '↺';
