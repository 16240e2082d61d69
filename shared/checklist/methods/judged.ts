import type { UnitId } from '../../units/unit';
import type { Working } from '../../refrigeration/working';
import {
  doubtsLetCount,
  refusedJudgement,
  type DoubtKind,
  type Doubt,
  type Figure,
  type Judgement,
  type Outcome,
} from '../judgement';

interface Found {
  readonly outcome: Outcome;
  readonly side?: 'low' | 'high' | null;
  readonly verdicts?: readonly string[];
  readonly doubts?: readonly Doubt[];
  /** The first is the one that the limit is about. */
  readonly figures: readonly Figure[];
  readonly limit?: {
    readonly low: number | null;
    readonly high: number | null;
    readonly unit: UnitId;
  } | null;
  readonly working: readonly Working[];
  readonly source: string;
}

/** A judgement out of what a method found. */
export function judged(found: Found): Judgement {
  const doubts = [...(found.doubts ?? [])];
  return {
    outcome: found.outcome,
    side: found.side ?? null,
    counts: doubtsLetCount(doubts),
    doubts,
    ...(found.verdicts && found.verdicts.length > 0 ? { verdicts: [...found.verdicts] } : {}),
    figures: [...found.figures],
    limit: found.limit ? { ...found.limit, source: found.source } : null,
    working: found.working.map((working) => ({ ...working, lines: [...working.lines] })),
  };
}

const DOUBTS: Readonly<Record<string, DoubtKind>> = {
  notFinite: 'notFinite',
  belowAbsoluteZero: 'belowAbsoluteZero',
  deeperThanVacuum: 'deeperThanVacuum',
  aboveCritical: 'aboveCritical',
  aboveTable: 'aboveTable',
  belowTable: 'belowTable',
};

/** The judgement of values that the calculation refuses; a reason without words of its own is a value out of reach. */
export const refusedBy = (reason: string): Judgement => refusedJudgement(DOUBTS[reason] ?? 'notPlausible');

/** On which side of its limits a value lies; an edge is within, with room for the last bit of a conversion. */
export function sideOf(value: number, low: number | null, high: number | null): 'low' | 'high' | null {
  const slack = 1e-9 * Math.max(1, Math.abs(value));
  if (low !== null && value < low - slack) return 'low';
  return high !== null && value > high + slack ? 'high' : null;
}
