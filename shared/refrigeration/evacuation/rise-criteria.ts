import { toSi } from '../../units/convert';
import { pascalAbsolute, second, type PascalAbsolute, type Second } from '../../units/quantity';

/** What a template asks of a rise test. Absolute pressures in pascals; at least one of the two limits is set. */
export interface RiseCriteria {
  /** Isolate the pump at or below this. */
  readonly target: PascalAbsolute;
  /** How long it stands isolated. */
  readonly hold: Second;
  /** At or below this at the end of the hold; null when only the rise counts. */
  readonly limit: PascalAbsolute | null;
  /** Rise of no more than this over the hold, in pascals; null when only the limit counts. */
  readonly greatestRisePa: number | null;
  /** Above this it is a leak whatever its shape; null when the shape alone tells. */
  readonly leakAbove: PascalAbsolute | null;
}

/** One published rule, for whoever writes a template. It isn't law: the project says which applies. */
export interface PublishedRiseCriteria {
  /** Stable key. */
  readonly id: string;
  /** Where it was published, as one line of text. */
  readonly source: string;
  /** Whether the source was read, or is quoted from memory and has to be opened before use. */
  readonly grade: 'read' | 'fromMemory';
  readonly criteria: RiseCriteria;
}

interface InMicrons {
  readonly target: number;
  readonly holdMinutes: number;
  readonly limit?: number;
  readonly greatestRise?: number;
  readonly leakAbove?: number;
}

const microns = (value: number): PascalAbsolute => pascalAbsolute(toSi(value, 'micron'));
const micronsOrNull = (value: number | undefined): PascalAbsolute | null =>
  value === undefined ? null : microns(value);

const published = (
  id: string,
  source: string,
  grade: PublishedRiseCriteria['grade'],
  { target, holdMinutes, limit, greatestRise, leakAbove }: InMicrons,
): PublishedRiseCriteria => ({
  id,
  source,
  grade,
  criteria: {
    target: microns(target),
    hold: second(toSi(holdMinutes, 'min')),
    limit: micronsOrNull(limit),
    greatestRisePa: micronsOrNull(greatestRise),
    leakAbove: micronsOrNull(leakAbove),
  },
});

/**
 * Published criteria of the last hold of an evacuation. They contradict each other, so none is a default: a template
 * names the one that its project prescribes.
 */
export const PUBLISHED_RISE_CRITERIA: readonly PublishedRiseCriteria[] = [
  published(
    'federalRefrigerantPiping',
    'UFGS 15182 Refrigerant Piping, 3.3 (older number of 23 23 00)',
    'read',
    { target: 300, holdMinutes: 60, limit: 500 },
  ),
  published('federalHeatPumps', 'UFGS 15741N Water Source Heat Pumps, 3.7', 'read', {
    target: 300,
    holdMinutes: 120,
    limit: 300,
  }),
  published('processMakerFirstHold', 'maker of packaged process coolers, first hold of 30 minutes', 'read', {
    target: 500,
    holdMinutes: 30,
    limit: 500,
  }),
  published(
    'processMakerSecondHold',
    'maker of packaged process coolers, second hold of 30 minutes',
    'read',
    {
      target: 500,
      holdMinutes: 30,
      limit: 750,
    },
  ),
  published('precisionCoolingMaker', 'maker of precision cooling units, installation manual', 'read', {
    target: 250,
    holdMinutes: 15,
    limit: 700,
  }),
  published('unitaryMaker', 'maker of unitary heat pumps, installation manual: three-way rule', 'read', {
    target: 500,
    holdMinutes: 10,
    limit: 1000,
    leakAbove: 2000,
  }),
  published('californiaGreenCode', 'CALGreen 5.508.2.6', 'fromMemory', {
    target: 300,
    holdMinutes: 1440,
    greatestRise: 100,
  }),
];
