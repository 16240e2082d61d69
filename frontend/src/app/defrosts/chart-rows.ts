import {
  barsOf,
  chartGroups,
  quietPieces,
  startKey,
  type ChartGroup,
  type DayPiece,
} from '#shared/contracts/defrost-chart';
import type { PlannedCircuit } from '#shared/contracts/defrost-plans';
import { clockText } from '#shared/contracts/defrost-words';
import type { ConcurrentLoad } from '#shared/refrigeration/defrost/concurrent-load';
import { DAY_S } from '#shared/refrigeration/defrost/day-circle';
import type { DefrostPlan, DefrostRules } from '#shared/refrigeration/defrost/defrost-plan-types';

// The chart counts in minutes: 1440 wide, whatever its width on the screen.

export interface ChartPiece {
  readonly x: number;
  readonly width: number;
}

export interface ChartBar {
  readonly key: string;
  readonly startS: number;
  readonly from: string;
  readonly to: string;
  readonly defrost: readonly ChartPiece[];
  readonly drip: readonly ChartPiece[];
  /** What a finger or a pointer has to hit. */
  readonly target: ChartPiece;
  readonly isMarked: boolean;
  readonly isKept: boolean;
}

export interface ChartRow {
  readonly circuit: PlannedCircuit;
  readonly bars: readonly ChartBar[];
}

export interface ChartStrip {
  /** An SVG path in minutes by 100, the floor at 100. */
  readonly path: string;
  /** Height of the limit in the same, `null` for none. */
  readonly limitY: number | null;
  readonly peak: number;
  readonly peakAt: string;
  readonly isOver: boolean;
}

export interface ChartGroupRows {
  readonly group: ChartGroup;
  readonly rows: readonly ChartRow[];
  readonly strip: ChartStrip;
  readonly by: 'load' | 'count';
}

/** All that is drawn of a plan, suction group by suction group. */
export function chartRows(
  circuits: readonly PlannedCircuit[],
  plan: DefrostPlan,
  rules: Pick<DefrostRules, 'largestShareOfLoad'>,
  load: ConcurrentLoad,
  marked: ReadonlySet<string>,
): readonly ChartGroupRows[] {
  return chartGroups(circuits).map((group) => {
    const shares = load.groups.find(({ groupId }) => groupId === group.id);
    const steps = (shares?.steps ?? []).map(({ fromS, share }) => ({ fromS, value: share }));
    return {
      group,
      by: shares?.by ?? 'load',
      rows: group.circuits.map((circuit) => ({ circuit, bars: chartBars(circuit, plan, marked) })),
      strip: chartStrip(steps, rules.largestShareOfLoad, shares?.peakShare ?? 0, shares?.peakAtS ?? 0),
    };
  });
}

function chartBars(circuit: PlannedCircuit, plan: DefrostPlan, marked: ReadonlySet<string>): ChartBar[] {
  return barsOf(circuit, plan).map(({ startS, defrost, drip }) => ({
    key: startKey(circuit.id, startS),
    startS,
    from: clockText(startS),
    to: clockText((startS + circuit.durationS + circuit.dripS) % DAY_S),
    defrost: defrost.map(chartPiece),
    drip: drip.map(chartPiece),
    target: targetOf(startS, circuit.durationS + circuit.dripS),
    isMarked: marked.has(startKey(circuit.id, startS)),
    isKept: circuit.fixedStartsS.includes(startS),
  }));
}

/** Half an hour wide at least: a bar of 15 minutes is a sliver on a phone. */
function targetOf(startS: number, lengthS: number): ChartPiece {
  const width = Math.max(30, lengthS / 60);
  return { x: Math.max(0, startS / 60 - (width - lengthS / 60) / 2), width };
}

export const chartPiece = ({ fromS, toS }: DayPiece): ChartPiece => ({
  x: fromS / 60,
  width: (toS - fromS) / 60,
});

export const quietRows = (rules: Pick<DefrostRules, 'quietHours'>): readonly ChartPiece[] =>
  quietPieces(rules.quietHours).map(chartPiece);

/** A stepped area over the day, as high as its limit or its peak asks. */
export function chartStrip(
  steps: readonly { readonly fromS: number; readonly value: number }[],
  limit: number | null,
  peak: number,
  peakAtS: number,
): ChartStrip {
  const most = Math.max(limit ?? 0, peak) * 1.08;
  const y = (value: number): number => (most > 0 ? 100 - (100 * value) / most : 100);
  const tops = steps.map(({ fromS, value }, index) => {
    const toS = steps[index + 1]?.fromS ?? DAY_S;
    return `L${fromS / 60} ${y(value).toFixed(2)}L${toS / 60} ${y(value).toFixed(2)}`;
  });
  return {
    path: `M0 100${tops.join('')}L1440 100Z`,
    limitY: limit === null ? null : y(limit),
    peak,
    peakAt: clockText(peakAtS),
    isOver: limit !== null && peak > limit + 1e-9,
  };
}
