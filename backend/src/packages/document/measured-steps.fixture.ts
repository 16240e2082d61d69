import { stepListSchema, type StepList } from '#shared/checklist/step';
import { both, stepList, uuid } from './package-steps.fixture';

/** Steps that are worked out of several values, as a system's own list asks them. */
export function measuredSteps(number: number): StepList {
  const { facts, template } = stepList(number);
  const base = {
    section: 'system',
    instruction: null,
    caution: null,
    fixtureId: null,
    coilId: null,
    required: true,
    source: 'Project specification',
  };
  return stepListSchema.parse({
    format: 1,
    template,
    facts,
    sections: [{ key: 'system', title: both('The whole system', 'Todo el sistema') }],
    steps: [
      {
        ...base,
        kind: 'measurement',
        key: 'test',
        title: both('Standing pressure test, high side', 'Prueba de presión, lado de alta'),
        method: 'pressureTest',
        criteria: { leastHold: 86_400 },
      },
      {
        ...base,
        kind: 'measurement',
        key: 'vacuum',
        title: both('Evacuation', 'Vacío'),
        method: 'evacuation',
        criteria: { target: 40, hold: 3600, limit: 66.66 },
      },
      {
        ...base,
        kind: 'measurement',
        key: 'charge',
        title: both('Charge', 'Carga'),
        method: 'refrigerantCharge',
        criteria: {},
      },
      {
        ...base,
        kind: 'superheat',
        key: 'superheat',
        coilId: uuid('c1', number),
        fixtureId: uuid('f1', number),
        title: both('Superheat of the coil', 'Recalentamiento del serpentín'),
        band: { lowK: 10 / 3, highK: 50 / 9 },
        judgedBy: 'timeWeighted',
      },
      {
        ...base,
        kind: 'trend',
        key: 'air',
        title: both('Air held for a day', 'Aire sostenido un día'),
        bandLowK: 272.15,
        bandHighK: 278.15,
        holdS: 86_400,
        longestExcursionS: 1800,
      },
    ],
  });
}
