import { judgeReturnGas } from '../../refrigeration/return-gas';
import type { Working } from '../../refrigeration/working';
import { kelvin, kelvinDifference, pascalAbsolute, pascalGauge } from '../../units/quantity';
import { refusedJudgement } from '../judgement';
import { saturationOf } from '../saturation-of';
import { judged, refusedBy } from './judged';
import { criterion, criterionIfAny, defineMethod, quantity, quantityIfKnown } from './method';

const kelvinOrNull = (value: number | null) => (value === null ? null : kelvin(value));

/** Of a coil these two labels are what a hunting valve showed; here they are limits, and are named so. */
const LIMIT_NAMES: Readonly<Record<string, string>> = {
  superheatLow: 'leastSuperheat',
  superheatHigh: 'mostSuperheat',
};

const withLimitNames = (working: Working): Working => ({
  ...working,
  lines: working.lines.map((line) => ({ ...line, label: LIMIT_NAMES[line.label] ?? line.label })),
});

/** The gas that comes back to the compressors: another check than the superheat at a coil, and both are needed. */
export const returnGasMethod = defineMethod({
  title: { en: 'Return gas', es: 'Gas de retorno' },
  fields: [
    quantity(
      'suctionPressure',
      'gaugePressure',
      'Suction pressure at the compressor',
      'Presión de succión en el compresor',
    ),
    quantity(
      'returnGasTemperature',
      'temperature',
      'Return gas temperature',
      'Temperatura del gas de retorno',
    ),
    quantityIfKnown(
      'dischargeTemperature',
      'temperature',
      'Discharge temperature',
      'Temperatura de descarga',
    ),
  ],
  rows: null,
  criteria: [
    criterion('superheatLow', 'temperatureDifference', 'Least superheat', 'Sobrecalentamiento mínimo'),
    criterionIfAny('superheatHigh', 'temperatureDifference', 'Most superheat', 'Sobrecalentamiento máximo'),
    criterionIfAny('returnGasHigh', 'temperature', 'Warmest return gas', 'Gas de retorno más caliente'),
    criterionIfAny('dischargeHigh', 'temperature', 'Hottest discharge', 'Descarga más caliente'),
  ],
  inTwoVisits: false,
  judge({ values, criteria, facts, source }) {
    const table = saturationOf(facts);
    if (!table) return refusedJudgement('unknownRefrigerant');
    const { superheatHigh } = criteria;
    const result = judgeReturnGas({
      table,
      suctionPressure: pascalGauge(values.suctionPressure),
      atmosphere: pascalAbsolute(facts.atmospherePaAbs),
      returnGasTemperature: kelvin(values.returnGasTemperature),
      dischargeTemperature: kelvinOrNull(values.dischargeTemperature),
      limits: {
        superheatLow: kelvinDifference(criteria.superheatLow),
        superheatHigh: superheatHigh === null ? null : kelvinDifference(superheatHigh),
        returnGasHigh: kelvinOrNull(criteria.returnGasHigh),
        dischargeHigh: kelvinOrNull(criteria.dischargeHigh),
      },
    });
    if (!result.ok) return refusedBy(result.reason);
    return judged({
      outcome: result.outcome,
      side: result.side,
      verdicts: [
        ...(result.consequence === null ? [] : [`returnGas_${result.consequence}`]),
        ...result.breaches.map((breach) => `returnGas_breach_${breach}`),
        ...(result.dischargeJudged ? [] : ['returnGas_dischargeNotMeasured']),
      ],
      doubts: result.superheat <= 0 ? [{ kind: 'liquidRisk', severity: 'ask' }] : [],
      figures: [
        { label: 'superheat', value: result.superheat, unit: 'K_diff' },
        { label: 'saturation', value: result.saturation, unit: 'K' },
      ],
      limit: { low: criteria.superheatLow, high: superheatHigh, unit: 'K_diff' },
      working: [withLimitNames(result.working)],
      source,
    });
  },
});
