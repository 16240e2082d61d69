import {
  DEFAULT_HEATER_TOLERANCE,
  judgeHeaterCurrent,
  type HeaterRating,
} from '../../refrigeration/electrical/heater-current';
import { ampere, volt, watt } from '../../units/quantity';
import { refusedJudgement } from '../judgement';
import { judged, refusedBy, sideOf } from './judged';
import { criterionIfAny, defineMethod, quantity, quantityIfKnown } from './method';

function ratingOf(power: number | null, current: number | null, voltage: number | null): HeaterRating | null {
  // A power means nothing without its voltage; a current stands by itself.
  if (power !== null && voltage !== null)
    return { kind: 'power', power: watt(power), voltage: volt(voltage) };
  if (current === null) return null;
  return { kind: 'current', current: ampere(current), voltage: voltage === null ? null : volt(voltage) };
}

/** Defrost heaters: the current in each line against what the nameplate gives at the voltage that is there. */
export const heaterCurrentMethod = defineMethod({
  title: { en: 'Defrost heater current', es: 'Corriente de resistencias de deshielo' },
  fields: [
    {
      kind: 'choice',
      key: 'supply',
      label: { en: 'Supply', es: 'Alimentación' },
      required: true,
      options: [
        { value: 'onePhase', label: { en: 'One phase', es: 'Monofásica' } },
        { value: 'threePhase', label: { en: 'Three phases', es: 'Trifásica' } },
      ],
    },
    quantityIfKnown('platePower', 'power', 'Nameplate power', 'Potencia de placa'),
    quantityIfKnown('plateCurrent', 'electricCurrent', 'Nameplate current', 'Corriente de placa'),
    quantityIfKnown('plateVoltage', 'voltage', 'Nameplate voltage', 'Voltaje de placa'),
    quantity('voltage', 'voltage', 'Voltage at the heater', 'Voltaje en la resistencia'),
    quantity('leg1', 'electricCurrent', 'Current, line 1', 'Corriente, línea 1'),
    quantityIfKnown('leg2', 'electricCurrent', 'Current, line 2', 'Corriente, línea 2'),
    quantityIfKnown('leg3', 'electricCurrent', 'Current, line 3', 'Corriente, línea 3'),
  ],
  rows: null,
  criteria: [
    criterionIfAny('tolerance', 'ratio', 'Off the expected by at most', 'Diferencia máxima con lo esperado'),
  ],
  inTwoVisits: false,
  judge({ values, criteria, source }) {
    const rating = ratingOf(values.platePower, values.plateCurrent, values.plateVoltage);
    if (!rating) return refusedJudgement('incomplete');
    const legs = values.supply === 'onePhase' ? [values.leg1] : [values.leg1, values.leg2, values.leg3];
    const read = legs.filter((leg) => leg !== null);
    if (read.length < legs.length) return refusedJudgement('incomplete');
    const { tolerance } = criteria;
    const result = judgeHeaterCurrent({
      supply: values.supply,
      rating,
      measuredVoltage: volt(values.voltage),
      legs: read.map(ampere),
      ...(tolerance === null ? {} : { tolerance }),
    });
    if (!result.ok) return refusedBy(result.reason);
    const furthest = result.legs.reduce((a, b) => (Math.abs(b.deviation) > Math.abs(a.deviation) ? b : a));
    const allowed = tolerance ?? DEFAULT_HEATER_TOLERANCE;
    const [low, high] = [result.expected * (1 - allowed), result.expected * (1 + allowed)];
    return judged({
      outcome: result.outcome,
      side: result.outcome === 'outside' ? sideOf(furthest.current, low, high) : null,
      verdicts: result.fault === null ? [] : [`heaterCurrent_${result.fault.pattern}`],
      figures: [
        { label: 'furthestLeg', value: furthest.current, unit: 'A' },
        { label: 'expectedCurrent', value: result.expected, unit: 'A' },
        { label: 'expectedPower', value: result.expectedPower, unit: 'W_el' },
        ...(result.imbalance === null
          ? []
          : [{ label: 'imbalance', value: result.imbalance, unit: 'fraction' as const }]),
      ],
      limit: { low, high, unit: 'A' },
      working: [result.working],
      source,
    });
  },
});
