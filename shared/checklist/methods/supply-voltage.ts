import {
  DEFAULT_GREATEST_UNBALANCE,
  judgeSupplyVoltage,
} from '../../refrigeration/electrical/supply-voltage';
import { volt } from '../../units/quantity';
import { judged, refusedBy } from './judged';
import { criterionIfAny, defineMethod, quantity } from './method';

/** Three line voltages against the nameplate and against each other. */
export const supplyVoltageMethod = defineMethod({
  title: { en: 'Supply voltage', es: 'Voltaje de alimentación' },
  fields: [
    quantity('nameplate', 'voltage', 'Nameplate voltage', 'Voltaje de placa'),
    quantity('line12', 'voltage', 'L1 to L2', 'L1 a L2'),
    quantity('line23', 'voltage', 'L2 to L3', 'L2 a L3'),
    quantity('line31', 'voltage', 'L3 to L1', 'L3 a L1'),
  ],
  rows: null,
  criteria: [
    criterionIfAny('tolerance', 'ratio', 'Off the nameplate by at most', 'Diferencia máxima con la placa'),
    criterionIfAny('greatestUnbalance', 'ratio', 'Greatest unbalance', 'Desbalance máximo'),
  ],
  inTwoVisits: false,
  judge({ values, criteria, source }) {
    const { tolerance, greatestUnbalance } = criteria;
    const result = judgeSupplyVoltage({
      nameplateVoltage: volt(values.nameplate),
      voltages: [volt(values.line12), volt(values.line23), volt(values.line31)],
      ...(tolerance === null ? {} : { voltageTolerance: tolerance }),
      ...(greatestUnbalance === null ? {} : { greatestUnbalance }),
    });
    if (!result.ok) return refusedBy(result.reason);
    const furthest = result.deviations.reduce((a, b) => (Math.abs(b) > Math.abs(a) ? b : a), 0);
    return judged({
      outcome: result.outcome,
      verdicts: result.problems.map((problem) => `supplyVoltage_${problem}`),
      figures: [
        ...(result.unbalance === null
          ? []
          : [{ label: 'unbalance', value: result.unbalance, unit: 'fraction' as const }]),
        { label: 'furthestFromNameplate', value: furthest, unit: 'fraction' },
      ],
      limit:
        result.unbalance === null
          ? null
          : { low: null, high: greatestUnbalance ?? DEFAULT_GREATEST_UNBALANCE, unit: 'fraction' },
      working: [result.working],
      source,
    });
  },
});
