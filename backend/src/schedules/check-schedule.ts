import type { ScheduleReason } from '#shared/contracts/schedule-reasons';
import { toSi } from '#shared/units/convert';
import type { FoundColumn } from './find-columns';
import type { ColumnId } from './schedule-columns';
import type { ScheduleProblems } from './schedule-problems';
import {
  missingValue,
  missingValues,
  type CircuitPart,
  type Part,
  type SuctionGroupPart,
  type SystemPart,
} from './schedule-tree';

// Only what can't be is refused: a schedule that is merely unusual has to get in.
const WARMEST_LOW_EVAPORATING_K = toSi(-5, 'degC');
const COLDEST_MEDIUM_EVAPORATING_K = toSi(-30, 'degC');

const OUT_OF_CLASS = { low: 'tooWarmForLow', medium: 'tooColdForMedium', high: 'tooColdForHigh' } as const;

/** A suction at the dew point may lie above a blend's mean evaporating temperature by half its glide. */
const HALF_A_GLIDE_K = 4;
const ROUNDING_K = toSi(0.5, 'degF_diff');

/** Names a problem at the line that a part's value was taken from. */
type Complain = (part: Part, id: ColumnId, reason: ScheduleReason) => void;

function checkSuperheat(fixture: Part, complain: Complain): void {
  const { superheatLow, superheatHigh } = fixture.values;
  if (superheatLow === undefined || superheatHigh === undefined || superheatLow < superheatHigh) return;
  complain(fixture, 'superheatHigh', { code: 'superheatBandEmpty', params: {} });
}

function checkTemperatures(fixture: Part, circuit: CircuitPart, complain: Complain): void {
  const { evaporatingTemperature: evaporating, dischargeAirTemperature: air } = fixture.values;
  if (evaporating === undefined) return;
  if (air !== undefined && air <= evaporating)
    complain(fixture, 'dischargeAirTemperature', { code: 'dischargeAirTooCold', params: {} });
  const { temperatureClass } = circuit.values;
  if (temperatureClass === undefined) return;
  const contradicts =
    temperatureClass === 'low'
      ? evaporating > WARMEST_LOW_EVAPORATING_K
      : evaporating < COLDEST_MEDIUM_EVAPORATING_K;
  if (contradicts)
    complain(fixture, 'evaporatingTemperature', { code: OUT_OF_CLASS[temperatureClass], params: {} });
}

function checkDefrost(circuit: CircuitPart, complain: Complain): void {
  const { defrostType, defrostsPerDay } = circuit.values;
  if (defrostsPerDay === undefined) return;
  if (defrostType === 'none' && defrostsPerDay > 0) {
    complain(circuit, 'defrostsPerDay', { code: 'defrostsWithoutDefrost', params: {} });
  }
  if (defrostType !== 'none' && defrostsPerDay === 0) {
    complain(circuit, 'defrostsPerDay', { code: 'defrostWithoutDefrosts', params: {} });
  }
}

function checkSuction(group: SuctionGroupPart, complain: Complain): void {
  const suction = group.values.saturatedSuctionTemperature;
  if (suction === undefined) return;
  for (const fixture of group.circuits.flatMap(({ fixtures }) => fixtures)) {
    const { evaporatingTemperature, evaporatingBasis } = fixture.values;
    const allowance = evaporatingBasis === 'mean' ? HALF_A_GLIDE_K : ROUNDING_K;
    if (evaporatingTemperature === undefined || evaporatingTemperature >= suction - allowance) continue;
    complain(fixture, 'evaporatingTemperature', { code: 'colderThanSuction', params: {} });
  }
}

/**
 * Names what is missing, and values that contradict one another.
 *
 * @param systems of the schedule
 * @param columns as found, to name the heading in a problem
 * @param problems takes what is found
 */
export function checkSchedule(
  systems: readonly SystemPart[],
  columns: ReadonlyMap<ColumnId, FoundColumn>,
  problems: ScheduleProblems,
): void {
  const complain: Complain = (part, id, reason) =>
    problems.add(part.lines.get(id) ?? part.line, columns.get(id)?.heading ?? null, reason);

  const groups = systems.flatMap((system) => system.groups);
  const circuits = groups.flatMap((group) => group.circuits);
  const fixtures = circuits.flatMap((circuit) => circuit.fixtures);
  for (const part of [...systems, ...groups, ...circuits, ...fixtures]) {
    for (const id of missingValues(part)) {
      // A missing column is named once, in the line of headings.
      if (columns.has(id)) complain(part, id, missingValue(id));
    }
  }
  for (const group of groups) checkSuction(group, complain);
  for (const circuit of circuits) {
    checkDefrost(circuit, complain);
    for (const fixture of circuit.fixtures) {
      checkSuperheat(fixture, complain);
      checkTemperatures(fixture, circuit, complain);
    }
  }
}
