import { judgePressureTest } from '../../refrigeration/pressure-test-verdict';
import { kelvin, kelvinDifference, pascalAbsolute, pascalGauge, second } from '../../units/quantity';
import { judged, refusedBy } from './judged';
import { criterion, criterionIfAny, defineMethod, quantity, quantityIfKnown } from './method';

/** What a gauge and a thermometer are taken to be good for where nobody says: common instruments, no source. */
const GAUGE_ACCURACY_PA = 6895;
const THERMOMETER_ACCURACY_K = 1;

/** A standing pressure test with dry nitrogen: what is left when the weather is taken out. */
export const pressureTestMethod = defineMethod({
  title: { en: 'Standing pressure test', es: 'Prueba de presión' },
  fields: [
    quantity('startPressure', 'gaugePressure', 'Pressure at the start', 'Presión al inicio'),
    quantity(
      'startTemperature',
      'temperature',
      'Pipe temperature at the start',
      'Temperatura del tubo al inicio',
    ),
    quantity('endPressure', 'gaugePressure', 'Pressure at the end', 'Presión al final'),
    quantity('endTemperature', 'temperature', 'Pipe temperature at the end', 'Temperatura del tubo al final'),
    quantity('held', 'duration', 'Time it stood', 'Tiempo que estuvo en prueba'),
    quantityIfKnown('gaugeAccuracy', 'pressureDifference', 'Gauge good to ±', 'Exactitud del manómetro ±'),
    quantityIfKnown(
      'temperatureAccuracy',
      'temperatureDifference',
      'Thermometer good to ±',
      'Exactitud del termómetro ±',
    ),
  ],
  rows: null,
  criteria: [
    criterion('leastHold', 'duration', 'Least time under pressure', 'Tiempo mínimo bajo presión'),
    criterionIfAny('leastPressure', 'gaugePressure', 'Least test pressure', 'Presión mínima de prueba'),
    criterionIfAny('allowedLoss', 'pressureDifference', 'Allowed loss', 'Pérdida permitida'),
  ],
  inTwoVisits: true,
  judge({ values, criteria, facts, source }) {
    const result = judgePressureTest({
      startPressure: pascalGauge(values.startPressure),
      startTemperature: kelvin(values.startTemperature),
      endPressure: pascalGauge(values.endPressure),
      endTemperature: kelvin(values.endTemperature),
      atmosphere: pascalAbsolute(facts.atmospherePaAbs),
      gaugeAccuracyPa: values.gaugeAccuracy ?? GAUGE_ACCURACY_PA,
      temperatureAccuracy: kelvinDifference(values.temperatureAccuracy ?? THERMOMETER_ACCURACY_K),
      held: second(values.held),
      leastHold: second(criteria.leastHold),
      allowedLossPa: criteria.allowedLoss ?? 0,
    });
    if (!result.ok) return refusedBy(result.reason);
    const { leastPressure } = criteria;
    const tooLow = leastPressure !== null && values.startPressure < leastPressure * (1 - 1e-9);
    const verdicts = [`pressureTest_${result.verdict}`, ...(tooLow ? ['pressureTest_pressureTooLow'] : [])];
    const isTight = result.verdict === 'tight' && !tooLow;
    const loss = Math.max(criteria.allowedLoss ?? 0, result.tolerancePa);
    return judged({
      outcome: isTight ? 'within' : 'outside',
      side: result.verdict === 'leak' ? 'low' : result.verdict === 'rising' ? 'high' : null,
      verdicts,
      figures: [
        { label: 'unexplainedChange', value: result.unexplainedChangePa, unit: 'Pa_diff' },
        { label: 'expectedPressure', value: result.expected, unit: 'Pag' },
        { label: 'explainedChange', value: result.explainedChangePa, unit: 'Pa_diff' },
        { label: 'tolerance', value: result.tolerancePa, unit: 'Pa_diff' },
      ],
      limit: { low: -loss, high: result.tolerancePa, unit: 'Pa_diff' },
      working: [result.working],
      source,
    });
  },
});
