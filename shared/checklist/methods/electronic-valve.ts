import { judgeElectronicValve } from '../../refrigeration/valve/electronic-valve';
import { fromSi } from '../../units/convert';
import { refusedJudgement } from '../judgement';
import { kelvin, kelvinDifference, pascalGauge } from '../../units/quantity';
import { judged } from './judged';
import { criterionIfAny, defineMethod, quantity } from './method';

/** How far transducer and gauge may differ, and the sensor be off in ice water, where nobody says: common practice. */
const PRESSURE_ROOM_PA = 13_790;
const SENSOR_ROOM_K = 0.5;

/** An electronic valve and its driver: what has to be so before its superheat means anything. */
export const electronicValveMethod = defineMethod({
  title: { en: 'Electronic valve and driver', es: 'Válvula electrónica y controlador' },
  fields: [
    {
      kind: 'words',
      key: 'driverRefrigerant',
      label: { en: 'Refrigerant in the driver', es: 'Refrigerante en el controlador' },
      required: true,
    },
    quantity('transducer', 'gaugePressure', 'Pressure in the driver', 'Presión en el controlador'),
    quantity('gauge', 'gaugePressure', 'Pressure on the gauge', 'Presión en el manómetro'),
    quantity('iceBath', 'temperature', 'Sensor in ice water', 'Sensor en agua con hielo'),
    quantity('opening', 'ratio', 'Valve open', 'Válvula abierta'),
  ],
  rows: null,
  criteria: [
    criterionIfAny(
      'pressureRoom',
      'pressureDifference',
      'Driver and gauge apart by at most',
      'Diferencia máxima entre controlador y manómetro',
    ),
    criterionIfAny('sensorRoom', 'temperatureDifference', 'Sensor off by at most', 'Error máximo del sensor'),
    criterionIfAny('leastOpening', 'ratio', 'Open at least', 'Apertura mínima'),
    criterionIfAny('greatestOpening', 'ratio', 'Open at most', 'Apertura máxima'),
  ],
  inTwoVisits: false,
  judge({ values, criteria, facts, source }) {
    const { pressureRoom, sensorRoom, leastOpening, greatestOpening } = criteria;
    const findings = judgeElectronicValve({
      driverRefrigerant: values.driverRefrigerant,
      circuitRefrigerant: facts.refrigerant,
      transducerReading: pascalGauge(values.transducer),
      gaugeReading: pascalGauge(values.gauge),
      gaugeAccuracyPa: pressureRoom ?? PRESSURE_ROOM_PA,
      iceBathReading: kelvin(values.iceBath),
      sensorAccuracy: kelvinDifference(sensorRoom ?? SENSOR_ROOM_K),
      openPercent: fromSi(values.opening, 'percent'),
      ...(leastOpening === null ? {} : { minOpenPercent: fromSi(leastOpening, 'percent') }),
      ...(greatestOpening === null ? {} : { maxOpenPercent: fromSi(greatestOpening, 'percent') }),
    });
    // Everything else was read, so it is a refrigerant's name without a letter or digit: a dash, a question mark.
    if (findings.some((finding) => finding.outcome === 'notJudged')) return refusedJudgement('incomplete');
    const outside = findings.filter((finding) => finding.outcome === 'outside');
    return judged({
      outcome: outside.length > 0 ? 'outside' : 'within',
      verdicts: outside.map((finding) => `electronicValve_${finding.check}`),
      figures: [
        { label: 'transducerOff', value: values.transducer - values.gauge, unit: 'Pa_diff' },
        { label: 'opening', value: values.opening, unit: 'fraction' },
      ],
      working: findings.filter(({ working }) => working.lines.length > 0).map(({ working }) => working),
      source,
    });
  },
});
