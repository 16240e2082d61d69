import { judgeWitnessedDefrost } from '../../refrigeration/defrost/witnessed-defrost';
import { kelvin, kelvinDifference, second } from '../../units/quantity';
import { refusedJudgement } from '../judgement';
import { judged, refusedBy } from './judged';
import { criterion, criterionIfAny, defineMethod, quantity, quantityIfKnown } from './method';

/** A defrost that somebody watched from its start to its end. It ends on temperature before its time, or is outside. */
export const witnessedDefrostMethod = defineMethod({
  title: { en: 'A whole defrost', es: 'Un deshielo completo' },
  fields: [
    quantity('took', 'duration', 'From start to end', 'Del inicio al final'),
    quantityIfKnown('endTemperature', 'temperature', 'Temperature at the end', 'Temperatura al final'),
  ],
  rows: null,
  criteria: [
    criterion('failSafe', 'duration', 'Longest time', 'Tiempo máximo'),
    criterionIfAny('terminationTemperature', 'temperature', 'Ends at', 'Termina a'),
    criterionIfAny(
      'temperatureTolerance',
      'temperatureDifference',
      'Reached when within',
      'Se alcanza a menos de',
    ),
  ],
  inTwoVisits: false,
  judge({ values, criteria, source }) {
    const { terminationTemperature, temperatureTolerance } = criteria;
    if (terminationTemperature !== null && values.endTemperature === null)
      return refusedJudgement('incomplete');
    const result = judgeWitnessedDefrost({
      startedAt: second(0),
      endedAt: second(values.took),
      endTemperature: values.endTemperature === null ? null : kelvin(values.endTemperature),
      terminationTemperature: terminationTemperature === null ? null : kelvin(terminationTemperature),
      failSafe: second(criteria.failSafe),
      temperatureTolerance: kelvinDifference(temperatureTolerance ?? 0),
    });
    if (!result.ok) return refusedBy(result.reason);
    return judged({
      outcome: result.outcome,
      side: result.ending === 'ranPastItsTime' || result.ending === 'endedOnFailSafe' ? 'high' : null,
      verdicts: [`witnessedDefrost_${result.ending}`],
      figures: [
        { label: 'duration', value: result.duration, unit: 's' },
        ...(values.endTemperature === null
          ? []
          : [{ label: 'endTemperature', value: values.endTemperature, unit: 'K' as const }]),
      ],
      limit: { low: null, high: criteria.failSafe, unit: 's' },
      working: [result.working],
      source,
    });
  },
});
