import {
  second,
  type Kelvin,
  type PascalAbsolute,
  type PascalGauge,
  type Second,
} from '../../units/quantity';
import { sourceOf } from '../saturation-reading';
import type { SaturationTable } from '../saturation/saturation-table';
import { superheat, type SuperheatResult } from '../superheat';
import type { SuperheatSample } from '../time-weighted-mean';
import type { Working } from '../working';
import { inOrderOfTime } from './in-order-of-time';

/** Both readings of one moment. */
export interface SuctionSample {
  readonly at: Second;
  /** At the coil's outlet, near the bulb. */
  readonly suctionPressure: PascalGauge;
  /** On the suction line at the bulb. */
  readonly lineTemperature: Kelvin;
}

export interface SuperheatTraceInputs {
  readonly table: SaturationTable;
  readonly atmosphere: PascalAbsolute;
  /** In any order. */
  readonly samples: readonly SuctionSample[];
}

type SuperheatFailure = Extract<SuperheatResult, { ok: false }>['reason'];

/** How many samples have no superheat, by reason. */
export type LeftOut = Readonly<Partial<Record<SuperheatFailure, number>>>;

export type SuperheatTraceResult =
  | {
      readonly ok: true;
      /** In ascending order of time, one at each; those without a superheat are left out. */
      readonly samples: readonly SuperheatSample[];
      readonly leftOut: LeftOut;
      readonly working: Working;
    }
  | { readonly ok: false; readonly reason: 'tooShort'; readonly leftOut: LeftOut };

function workingOf(inputs: SuperheatTraceInputs, samples: readonly SuperheatSample[]): Working {
  let lowest = Infinity;
  let highest = -Infinity;
  for (const sample of samples) {
    lowest = Math.min(lowest, sample.superheat);
    highest = Math.max(highest, sample.superheat);
  }
  const duration = (samples.at(-1)?.at ?? NaN) - (samples[0]?.at ?? NaN);
  return {
    formula: 'superheatTrace',
    source: sourceOf(inputs.table),
    lines: [
      { label: 'atmosphere', value: inputs.atmosphere, unit: 'Pa' },
      { label: 'samplesRead', value: inputs.samples.length, unit: 'count' },
      { label: 'samplesUsed', value: samples.length, unit: 'count' },
      { label: 'duration', value: duration, unit: 's' },
      { label: 'minimumSuperheat', value: lowest, unit: 'K_diff' },
      { label: 'maximumSuperheat', value: highest, unit: 'K_diff' },
    ],
  };
}

/**
 * The superheat at each moment of a log: line temperature minus dew temperature at the suction pressure, as `superheat`.
 *
 * @param inputs seconds, gauge pressures in pascals, line temperatures in kelvin; the atmosphere absolute, in pascals
 * @returns superheats in kelvin, never clamped, with how many samples had none and why; `tooShort` when fewer than two do
 * @range each sample within the table's limits
 * @source the table's `source` and `reference`
 * @example superheatTrace({ table: R_448A, atmosphere: 1 atm, samples: [0 s: 45 psig, 28 °F; …] }) // 7.1 °F; …
 */
export function superheatTrace(inputs: SuperheatTraceInputs): SuperheatTraceResult {
  const { table, atmosphere } = inputs;
  const leftOut: Partial<Record<SuperheatFailure, number>> = {};
  const samples: SuperheatSample[] = [];
  const ordered = inOrderOfTime(inputs.samples);
  for (const { at, suctionPressure, lineTemperature } of ordered) {
    const result = superheat({ table, atmosphere, suctionPressure, lineTemperature });
    if (result.ok) samples.push({ at: second(at), superheat: result.superheat });
    else leftOut[result.reason] = (leftOut[result.reason] ?? 0) + 1;
  }
  if (samples.length < 2) return { ok: false, reason: 'tooShort', leftOut };
  return { ok: true, samples, leftOut, working: workingOf(inputs, samples) };
}
