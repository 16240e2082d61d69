import { parseUnit } from '../../units/parse-unit';
import { UNITS, type Dimension, type UnitId } from '../../units/unit';

/** What a heading's words say is measured. */
export type HeadingQuantity = 'time' | 'superheat' | 'pressure' | 'temperature';

// Word beginnings in English and Spanish, without accents. Superheat first: "superheat temperature" is a difference.
const WORDS: readonly (readonly [HeadingQuantity, RegExp])[] = [
  ['superheat', /\bsuper ?-?heat|\bsobrecalent|\brecalent|\bsh\b/],
  ['pressure', /\bpres(?:s|i|\b)|\bpsi|\bvacuum|\bvacio/],
  ['temperature', /\btemp|\bt\d*\b/],
  [
    'time',
    /time(?:stamp)?\b|\bdate|\belapsed|\bfecha|\bhora\b|\btiempo|\btranscurr|\bsec(?:ond)?s?\b|\bseg(?:undo)?s?\b|\bminut/,
  ],
];

const DIMENSIONS: Readonly<Record<HeadingQuantity, readonly Dimension[]>> = {
  time: ['duration'],
  superheat: ['temperatureDifference'],
  pressure: ['gaugePressure', 'absolutePressure', 'vacuum'],
  temperature: ['temperature'],
};

/** Lower case, without accents, with spaces for underscores. */
const simplify = (heading: string): string =>
  heading
    .toLowerCase()
    .normalize('NFD')
    .replace(/[\u0300-\u036f]/g, '')
    .replaceAll('_', ' ');

/**
 * What a column measures by its heading's words, English or Spanish.
 *
 * @param heading as written
 * @returns the quantity, or null when no word says so
 * @example headingQuantity('Presión de succión (psig)') // 'pressure'
 */
export function headingQuantity(heading: string): HeadingQuantity | null {
  const words = simplify(heading);
  return WORDS.find(([, pattern]) => pattern.test(words))?.[0] ?? null;
}

/** The dimension that the words ask of a unit that has several, such as °F or kPa. */
function dimensionAsked(heading: string): Dimension | undefined {
  const words = simplify(heading);
  const quantity = headingQuantity(heading);
  if (quantity === 'superheat' || /\bsubcool|\bsubenfri|\bdiff|\bdelta|\bdt\b/.test(words)) {
    return 'temperatureDifference';
  }
  if (/\babs/.test(words)) return 'absolutePressure';
  return /\bgau?ge\b|\bmanom/.test(words) ? 'gaugePressure' : undefined;
}

/** Whether a unit outside brackets is meant as one: "Case A" has no amperes, "Temp min" no minutes, "Air in" no inches. */
function isMeant(text: string, unit: UnitId, quantity: HeadingQuantity | null): boolean {
  const { dimension } = UNITS[unit];
  if (quantity !== null && DIMENSIONS[quantity].includes(dimension)) return true;
  if (dimension === 'temperature' || dimension === 'temperatureDifference') return /[°º˚]/.test(text);
  return DIMENSIONS.pressure.includes(dimension) && /^(?:psi|bar|kpa)/i.test(text);
}

/** A unit by its spelling; a schedule's spellings lack the Spanish seconds. */
function unitOf(text: string, asked: Dimension | undefined): UnitId | undefined {
  if (/^seg(?:undos?)?\.?$/i.test(text.trim())) return 's';
  return (asked === undefined ? undefined : parseUnit(text, asked)) ?? parseUnit(text);
}

/**
 * The unit that a column's heading names, in brackets or as its last word: "Pressure (psig)", "Temp [°F]", "T °C".
 *
 * @param heading as written; U+FFFD (a degree sign in a file of another encoding) reads as a degree sign
 * @returns the unit, or null when none is named for sure. As everywhere in the project "psi", "bar" and "kPa" are gauge
 *   pressures unless the heading says absolute
 * @example headingUnit('Superheat (°F)') // 'degF_diff'
 */
export function headingUnit(heading: string): UnitId | null {
  const text = heading.replaceAll('\uFFFD', '°').replaceAll('_', ' ').trim();
  const asked = dimensionAsked(text);
  const bracketed = [...text.matchAll(/[([{]([^()[\]{}]+)[)\]}]/g)].map((match) => match[1] ?? '').reverse();
  for (const inner of bracketed) {
    const unit = unitOf(inner, asked);
    if (unit !== undefined) return unit;
  }
  const quantity = headingQuantity(text);
  const words = text
    .replace(/[([{][^()[\]{}]*[)\]}]/g, ' ')
    .trim()
    .split(/[\s,:/]+/);
  for (const candidate of [text, words.slice(-2).join(' '), words.at(-1) ?? '']) {
    const unit = unitOf(candidate, asked);
    if (unit !== undefined && isMeant(candidate, unit, quantity)) return unit;
  }
  return null;
}
