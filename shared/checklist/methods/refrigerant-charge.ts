import { recordCharge } from '../../refrigeration/charge/charge-record';
import { annualisedLeakRate, LEAK_RATE_THRESHOLDS } from '../../refrigeration/charge/leak-rate';
import type { Working } from '../../refrigeration/working';
import { kilogram, type Kilogram } from '../../units/quantity';
import { refusedJudgement, type Doubt } from '../judgement';
import { judged, refusedBy, sideOf } from './judged';
import { criterionIfAny, defineMethod, quantity } from './method';

/**
 * How the leak rate will be counted from this charge, with the addition that would reach the threshold of commercial
 * refrigeration within a year: the record that later years need.
 */
function leakRateRecord(fullCharge: Kilogram): readonly Working[] {
  const added = kilogram(fullCharge * LEAK_RATE_THRESHOLDS.commercialRefrigeration);
  const rate = annualisedLeakRate({ added, fullCharge, daysSinceLastAddition: null });
  return rate.ok ? [rate.working] : [];
}

/** Every cylinder that stood on the scale, in and out: the charge that the leak rate is counted from for years. */
export const refrigerantChargeMethod = defineMethod({
  title: { en: 'Refrigerant charge', es: 'Carga de refrigerante' },
  fields: [],
  rows: {
    label: { en: 'Cylinder', es: 'Cilindro' },
    fields: [
      {
        kind: 'words',
        key: 'cylinder',
        label: { en: 'Cylinder number', es: 'Número de cilindro' },
        required: true,
      },
      {
        kind: 'words',
        key: 'refrigerant',
        label: { en: 'Refrigerant on its label', es: 'Refrigerante en la etiqueta' },
        required: true,
      },
      {
        kind: 'choice',
        key: 'direction',
        label: { en: 'Refrigerant went', es: 'El refrigerante' },
        required: true,
        options: [
          { value: 'in', label: { en: 'into the system', es: 'entró al sistema' } },
          { value: 'out', label: { en: 'out of the system', es: 'salió del sistema' } },
        ],
      },
      quantity('before', 'mass', 'Scale before', 'Báscula antes'),
      quantity('after', 'mass', 'Scale after', 'Báscula después'),
    ],
    least: 1,
    most: 100,
  },
  criteria: [
    criterionIfAny('least', 'mass', 'Least charge', 'Carga mínima'),
    criterionIfAny('most', 'mass', 'Most charge', 'Carga máxima'),
  ],
  inTwoVisits: true,
  judge({ rows, criteria, facts, source }) {
    const result = recordCharge({
      refrigerant: facts.refrigerant,
      movements: rows.map((row) => ({
        cylinderId: row.cylinder,
        refrigerant: row.refrigerant,
        direction: row.direction,
        before: kilogram(row.before),
        after: kilogram(row.after),
      })),
    });
    if (!result.ok) {
      const isOther = result.refusals.some(({ reason }) => reason === 'otherRefrigerant');
      const isWrongWay = result.refusals.some(({ reason }) => reason === 'wrongWay');
      return isOther
        ? refusedJudgement('wrongRefrigerant')
        : isWrongWay
          ? refusedJudgement('wrongWay')
          : refusedBy(result.reason);
    }
    const { least, most } = criteria;
    const side = sideOf(result.net, least, most);
    const isJudged = least !== null || most !== null;
    const doubts: Doubt[] = result.doubts.some(({ kind }) => kind === 'massDoesNotFollow')
      ? [{ kind: 'massDoesNotFollow', severity: 'ask' }]
      : [];
    return judged({
      outcome: isJudged ? (side ? 'outside' : 'within') : 'recorded',
      side,
      doubts,
      figures: [
        { label: 'charge', value: result.net, unit: 'kg' },
        { label: 'chargedIn', value: result.in, unit: 'kg' },
        { label: 'takenOut', value: result.out, unit: 'kg' },
      ],
      limit: isJudged ? { low: least, high: most, unit: 'kg' } : null,
      working: [result.working, ...leakRateRecord(result.net)],
      source,
    });
  },
});
