import type { DefrostPlan } from '#shared/refrigeration/defrost/defrost-plan-types';
import { concurrentLoad, type GroupLoadInDefrost } from '#shared/refrigeration/defrost/concurrent-load';
import {
  barsOf,
  chartGroups,
  quietPieces,
  startKey,
  startsInBreach,
  type ChartGroup,
} from '#shared/contracts/defrost-chart';
import type { SavedDefrostPlan } from '#shared/contracts/defrost-plans';
import { clockText, percentText } from '#shared/contracts/defrost-words';
import { formatQuantity } from '#shared/units/format';
import { gap, type Block } from '../../pdf/block';
import { dayHead, dayRow, dayStrip } from '../../pdf/day-chart';
import { say, type DocumentContext } from './document-context';
import { SECTION_WORDS as WORDS } from './defrost-section-words';

/** The plan over 24 hours: the rows of each suction group with its strip, then the heaters of all. */
export function defrostChartBlocks(context: DocumentContext, saved: SavedDefrostPlan): Block[] {
  const load = concurrentLoad(saved.circuits, saved.plan);
  const groups = chartGroups(saved.circuits).flatMap((group) => [
    ...rowBlocks(saved, group),
    ...shareBlocks(context, saved, load.groups, group),
  ]);
  const { steps, peakW, peakAtS } = load.heaters;
  const limit = saved.rules.largestHeaterDemandW;
  // Heaters that nobody stated draw nothing here; a strip of nothing would say that they don't.
  if (peakW === 0) return groups;
  const power = (watts: number): string => formatQuantity(watts, 'kW_el', context.language);
  const label = [
    say(context, WORDS.heaters),
    `${say(context, WORDS.peak)} ${power(peakW)} ${clockText(peakAtS)}`,
    limit === null ? say(context, WORDS.noLimit) : `${say(context, WORDS.limit)} ${power(limit)}`,
  ].join(' · ');
  const values = steps.map(({ fromS, demandW }) => ({ fromS, value: demandW }));
  return [...groups, gap(4), dayStrip({ label, steps: values, limit, alt: label })];
}

function rowBlocks(saved: SavedDefrostPlan, group: ChartGroup): Block[] {
  const marked = startsInBreach(saved.breaches, saved.circuits, saved.plan);
  const shaded = quietPieces(saved.rules.quietHours);
  const head = dayHead(group.name);
  const rows = group.circuits.map((circuit) => {
    const bars = barsOf(circuit, saved.plan);
    return dayRow(
      {
        label: circuit.code,
        shaded,
        bars: bars.map(({ startS, defrost, drip }) => ({
          full: defrost,
          open: drip,
          isMarked: marked.has(startKey(circuit.id, startS)),
        })),
        alt: `${circuit.code}: ${startsText(saved.plan, circuit.id) || '—'}`,
      },
      head,
    );
  });
  const last = rows.at(-1);
  return [head, ...rows.slice(0, -1), ...(last ? [{ ...last, keepWithNext: true }] : [])];
}

function shareBlocks(
  context: DocumentContext,
  saved: SavedDefrostPlan,
  loads: readonly GroupLoadInDefrost[],
  group: ChartGroup,
): Block[] {
  const load = loads.find(({ groupId }) => groupId === group.id);
  if (!load) return [];
  const limit = saved.rules.largestShareOfLoad;
  const percent = (fraction: number): string => percentText(fraction, context.language);
  const label = [
    say(context, load.by === 'load' ? WORDS.shareOfLoad : WORDS.shareByCount),
    `${say(context, WORDS.peak)} ${percent(load.peakShare)} ${clockText(load.peakAtS)}`,
    `${say(context, WORDS.limit)} ${percent(limit)}`,
  ].join(' · ');
  const steps = load.steps.map(({ fromS, share }) => ({ fromS, value: share }));
  return [dayStrip({ label: `${label}`, steps, limit, alt: `${group.name}: ${label}` }), gap(8)];
}

/** The starts of a circuit on a 24-hour clock. */
export const startsText = (plan: DefrostPlan, circuitId: string): string =>
  plan
    .filter((entry) => entry.circuitId === circuitId)
    .flatMap(({ startsS }) => startsS)
    .sort((a, b) => a - b)
    .map(clockText)
    .join('  ');
