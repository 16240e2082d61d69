import { judgeRise } from '../../refrigeration/evacuation/judge-rise';
import { kelvin, pascalAbsolute, second } from '../../units/quantity';
import { refusedJudgement } from '../judgement';
import { judged, refusedBy } from './judged';
import { criterion, criterionIfAny, defineMethod, quantity, quantityIfKnown } from './method';

/** A vacuum gauge's own unrest and its slow way to a reading: 10 µm; common practice, no source. */
const GAUGE_NOISE_PA = 1.333224;

/** The rise test that ends an evacuation: pump isolated, micron gauge watched. The template sets every criterion. */
export const evacuationMethod = defineMethod({
  title: { en: 'Evacuation, rise test', es: 'Vacío, prueba de aumento' },
  fields: [quantityIfKnown('ambientTemperature', 'temperature', 'Air temperature', 'Temperatura del aire')],
  rows: {
    label: { en: 'Reading', es: 'Lectura' },
    fields: [
      quantity('since', 'duration', 'Time since the pump was isolated', 'Tiempo desde que se aisló la bomba'),
      quantity('pressure', 'vacuum', 'Vacuum gauge', 'Vacuómetro'),
    ],
    least: 2,
    most: 100,
  },
  criteria: [
    criterion('target', 'vacuum', 'Isolate at or below', 'Aislar en o por debajo de'),
    criterion('hold', 'duration', 'Time isolated', 'Tiempo aislado'),
    criterionIfAny('limit', 'vacuum', 'At or below at the end', 'Al final, en o por debajo de'),
    criterionIfAny('greatestRise', 'vacuum', 'Greatest rise', 'Aumento máximo'),
    criterionIfAny('leakAbove', 'vacuum', 'A leak above', 'Es fuga por encima de'),
  ],
  inTwoVisits: true,
  judge({ values, rows, criteria, source }) {
    if (criteria.limit === null && criteria.greatestRise === null) return refusedJudgement('noCriterion');
    const readings = rows
      .map((row) => ({ at: second(row.since), pressure: pascalAbsolute(row.pressure) }))
      .sort((a, b) => a.at - b.at);
    const { ambientTemperature } = values;
    const result = judgeRise({
      readings,
      criteria: {
        target: pascalAbsolute(criteria.target),
        hold: second(criteria.hold),
        limit: criteria.limit === null ? null : pascalAbsolute(criteria.limit),
        greatestRisePa: criteria.greatestRise,
        leakAbove: criteria.leakAbove === null ? null : pascalAbsolute(criteria.leakAbove),
      },
      ...(ambientTemperature === null ? {} : { ambientTemperature: kelvin(ambientTemperature) }),
    });
    if (!result.ok) return refusedBy(result.reason);
    // The first value that an isolated system can't show: then the valve wasn't shut, or rows were mixed up.
    const falls =
      result.verdict === 'dryAndTight' &&
      result.risePa < -Math.max(GAUGE_NOISE_PA, 0.1 * (result.endPressure - result.risePa));
    const verdict = falls ? 'falling' : result.verdict;
    return judged({
      outcome: verdict === 'dryAndTight' ? 'within' : 'outside',
      side: verdict === 'dryAndTight' || verdict === 'tooShort' ? null : falls ? 'low' : 'high',
      verdicts: [`evacuation_${verdict}`, ...result.notes.map((note) => `evacuation_${note}`)],
      figures: [
        { label: 'endVacuum', value: result.endPressure, unit: 'Pa_vac' },
        { label: 'rise', value: result.risePa, unit: 'Pa_vac' },
        { label: 'held', value: result.held, unit: 's' },
      ],
      limit: criteria.limit === null ? null : { low: null, high: criteria.limit, unit: 'Pa_vac' },
      working: [result.working],
      source,
    });
  },
});
