import { kelvinDifference, second, type KelvinDifference, type Second } from '../units/quantity';
import { toSi } from '../units/convert';

/** A coil of the suction group whose return gas is low, as its circuit was left. */
export interface FloodHuntCoil {
  readonly coilId: string;
  readonly fixtureTag: string;
  readonly circuitCode: string;
  /** Lowest superheat while the valve hunted, as left; null when never recorded. */
  readonly minimumSuperheat: KelvinDifference | null;
  /** Mean or steady superheat as left; null when never recorded. */
  readonly superheat: KelvinDifference | null;
  /** Whether something changed since (the group's set point, a neighbour) that makes the record old. */
  readonly asLeftStale: boolean;
  /** Since the last defrost ended; null when unknown. */
  readonly sinceDefrost: Second | null;
  /** Whether an output of this coil or circuit is forced by hand. */
  readonly overrideStanding: boolean;
  /** Design load; null when the schedule doesn't say. */
  readonly loadW: number | null;
}

/** Why a coil may be flooding, strongest first; keys that screens translate. */
export const FLOOD_REASONS = [
  'minimumAtOrBelowZero',
  'overrideStanding',
  'lowSuperheat',
  'neverSet',
  'stale',
  'recentDefrost',
] as const;

export type FloodReason = (typeof FLOOD_REASONS)[number];

export interface FloodSuspect {
  readonly coilId: string;
  readonly fixtureTag: string;
  readonly circuitCode: string;
  /** In the order of `FLOOD_REASONS`; empty when nothing speaks against the coil. */
  readonly reasons: readonly FloodReason[];
  /** The lower one of minimum and superheat; null when neither is known. */
  readonly lowestSuperheat: KelvinDifference | null;
}

/** The lowest target read in coil makers' manuals begins here: 3 °F of difference. */
export const LOW_COIL_SUPERHEAT = kelvinDifference(toSi(3, 'degF_diff'));

/** One case maker judges a case an hour after its defrost; before, liquid may come over without any fault. */
export const RECENT_DEFROST = second(toSi(1, 'h'));

const isKnown = <Value extends number>(value: Value | null): value is Value =>
  value !== null && Number.isFinite(value);

function lowestOf({ minimumSuperheat, superheat }: FloodHuntCoil): KelvinDifference | null {
  const known = [minimumSuperheat, superheat].filter(isKnown);
  return known.length === 0 ? null : kelvinDifference(Math.min(...known));
}

function reasonsOf(coil: FloodHuntCoil, lowest: KelvinDifference | null): readonly FloodReason[] {
  const holds: Readonly<Record<FloodReason, boolean>> = {
    minimumAtOrBelowZero: lowest !== null && lowest <= 0,
    overrideStanding: coil.overrideStanding,
    lowSuperheat: isKnown(coil.superheat) && coil.superheat < LOW_COIL_SUPERHEAT,
    neverSet: lowest === null,
    stale: coil.asLeftStale,
    recentDefrost: isKnown(coil.sinceDefrost) && coil.sinceDefrost < RECENT_DEFROST,
  };
  return FLOOD_REASONS.filter((reason) => holds[reason]);
}

/** What a coil is ordered by, most important first: the smaller key stands first. */
type Keys = readonly (number | string)[];

const keysOf = (coil: FloodHuntCoil, suspect: FloodSuspect): Keys => [
  ...FLOOD_REASONS.map((reason) => (suspect.reasons.includes(reason) ? 0 : 1)),
  suspect.lowestSuperheat ?? Infinity,
  isKnown(coil.loadW) ? -coil.loadW : Infinity,
  coil.fixtureTag,
  coil.circuitCode,
  coil.coilId,
];

function compareKeys(a: Keys, b: Keys): number {
  for (const [index, ofA] of a.entries()) {
    const ofB = b[index] ?? ofA;
    if (ofA < ofB) return -1;
    if (ofA > ofB) return 1;
  }
  return 0;
}

/**
 * Where to look when liquid comes back to a suction group: its coils, the likeliest one first. The first one's fixture is
 * the one to feel first (its suction line at the coil: cold and sweating or frosted past the bulb), for its reasons.
 *
 * The order is lexicographic, so that it can be told in one sentence: a coil with a stronger reason goes before every coil
 * without it, whatever else speaks against that one.
 *
 * 1. `minimumAtOrBelowZero`: it was seen to flood.
 * 2. `overrideStanding`: a valve forced by hand floods however well it was set, and is quickly put back.
 * 3. `lowSuperheat`: left with little room (below `LOW_COIL_SUPERHEAT`).
 * 4. `neverSet`: nobody knows.
 * 5. `stale`: it was right, under other conditions.
 * 6. `recentDefrost`: passes by itself (less than `RECENT_DEFROST` ago).
 * 7. Among equals the lower superheat, then the larger load (it sends more liquid), then fixture, circuit and coil id by
 *    code point, so that two devices order alike.
 *
 * @param coils of one suction group, in any order, each id once; a number that is none counts as unknown
 * @returns every coil once, the same order for the same coils
 * @source common practice, no publication; the two thresholds: one maker each, see the constants
 * @example rankFloodSuspects(coils)[0]?.fixtureTag // the case to feel first
 */
export function rankFloodSuspects(coils: readonly FloodHuntCoil[]): readonly FloodSuspect[] {
  return coils
    .map((coil) => {
      const { coilId, fixtureTag, circuitCode } = coil;
      const lowestSuperheat = lowestOf(coil);
      const reasons = reasonsOf(coil, lowestSuperheat);
      const suspect: FloodSuspect = { coilId, fixtureTag, circuitCode, reasons, lowestSuperheat };
      return { suspect, keys: keysOf(coil, suspect) };
    })
    .sort((a, b) => compareKeys(a.keys, b.keys))
    .map(({ suspect }) => suspect);
}
