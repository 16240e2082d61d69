import {
  evaporatingPressure,
  evaporatingTemperature,
  type EvaporatingBasis,
} from '../../refrigeration/evaporating-temperature';
import { toAbsolute, toGauge } from '../../refrigeration/gauge-pressure';
import { kelvin, pascalAbsolute, pascalGauge } from '../../units/quantity';
import { refusedJudgement } from '../judgement';
import { saturationOf } from '../saturation-of';
import { judged, refusedBy, sideOf } from './judged';
import { criterion, criterionIfAny, defineMethod, quantity } from './method';

/**
 * The pressure that an evaporator pressure regulator holds, against the schedule's evaporating temperature: dew or mean,
 * as the schedule says it, and a blend's two differ by half its glide.
 */
export const regulatorPressureMethod = defineMethod({
  title: { en: 'Evaporating temperature at the regulator', es: 'Temperatura de evaporación en el regulador' },
  fields: [
    quantity(
      'pressure',
      'gaugePressure',
      'Pressure at the regulator’s inlet',
      'Presión a la entrada del regulador',
    ),
  ],
  rows: null,
  criteria: [
    criterionIfAny('dew', 'temperature', 'Evaporating temperature, dew', 'Temperatura de evaporación, rocío'),
    criterionIfAny(
      'mean',
      'temperature',
      'Evaporating temperature, mean',
      'Temperatura de evaporación, media',
    ),
    criterion('room', 'temperatureDifference', 'Off by at most', 'Diferencia máxima'),
  ],
  inTwoVisits: false,
  judge({ values, criteria, facts, source }) {
    const wanted = criteria.dew ?? criteria.mean;
    // Two would contradict each other on every blend.
    if (wanted === null || (criteria.dew !== null && criteria.mean !== null))
      return refusedJudgement('noCriterion');
    const basis: EvaporatingBasis = criteria.dew === null ? 'mean' : 'dew';
    const table = saturationOf(facts);
    if (!table) return refusedJudgement('unknownRefrigerant');
    const atmosphere = pascalAbsolute(facts.atmospherePaAbs);
    const found = evaporatingTemperature(table, toAbsolute(pascalGauge(values.pressure), atmosphere), basis);
    if (!found.ok) return refusedBy(found.reason);
    const asked = evaporatingPressure(table, kelvin(wanted), basis);
    const [low, high] = [wanted - criteria.room, wanted + criteria.room];
    const side = sideOf(found.temperature, low, high);
    return judged({
      outcome: side ? 'outside' : 'within',
      side,
      figures: [
        { label: 'evaporatingTemperature', value: found.temperature, unit: 'K' },
        ...(asked.ok
          ? [{ label: 'askedPressure', value: toGauge(asked.pressure, atmosphere), unit: 'Pag' as const }]
          : []),
        { label: 'glide', value: found.glide, unit: 'K_diff' },
      ],
      limit: { low, high, unit: 'K' },
      working: [found.working, ...(asked.ok ? [asked.working] : [])],
      source,
    });
  },
});
