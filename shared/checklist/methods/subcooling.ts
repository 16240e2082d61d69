import { subcooling } from '../../refrigeration/subcooling';
import { kelvin, pascalAbsolute, pascalGauge } from '../../units/quantity';
import { refusedJudgement } from '../judgement';
import { saturationOf } from '../saturation-of';
import { judged, refusedBy, sideOf } from './judged';
import { criterionIfAny, defineMethod, quantity } from './method';

/** Subcooling of a liquid line, from its pressure and temperature at one place. */
export const subcoolingMethod = defineMethod({
  title: { en: 'Subcooling', es: 'Subenfriamiento' },
  fields: [
    quantity('liquidPressure', 'gaugePressure', 'Liquid pressure', 'Presión de líquido'),
    quantity('lineTemperature', 'temperature', 'Line temperature', 'Temperatura de la línea'),
  ],
  rows: null,
  criteria: [
    criterionIfAny('low', 'temperatureDifference', 'Least subcooling', 'Subenfriamiento mínimo'),
    criterionIfAny('high', 'temperatureDifference', 'Most subcooling', 'Subenfriamiento máximo'),
  ],
  inTwoVisits: false,
  judge({ values, criteria, facts, source }) {
    const table = saturationOf(facts);
    if (!table) return refusedJudgement('unknownRefrigerant');
    const result = subcooling({
      table,
      liquidPressure: pascalGauge(values.liquidPressure),
      atmosphere: pascalAbsolute(facts.atmospherePaAbs),
      lineTemperature: kelvin(values.lineTemperature),
    });
    if (!result.ok) return refusedBy(result.reason);
    const { low, high } = criteria;
    const isJudged = low !== null || high !== null;
    const side = isJudged ? sideOf(result.subcooling, low, high) : null;
    return judged({
      outcome: isJudged ? (side ? 'outside' : 'within') : 'recorded',
      side,
      figures: [
        { label: 'subcooling', value: result.subcooling, unit: 'K_diff' },
        { label: 'bubbleTemperature', value: result.saturation, unit: 'K' },
        { label: 'glide', value: result.glide, unit: 'K_diff' },
      ],
      limit: isJudged ? { low, high, unit: 'K_diff' } : null,
      working: [result.working],
      source,
    });
  },
});
