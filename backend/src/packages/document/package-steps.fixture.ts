import type { Signature } from '#shared/checklist/signature';
import { stepListSchema, type StepList } from '#shared/checklist/step';
import type { CircuitSpecification } from '#shared/plant/plant';

// A made-up opening in memory: nothing in it is a real store, person or product.

export const uuid = (prefix: string, number: number): string =>
  `${prefix.padStart(8, '0')}-0000-7000-8000-${String(number).padStart(12, '0')}`;

export const PEOPLE = {
  installer: { id: uuid('a1', 1), name: 'Marisol Quintero' },
  lead: { id: uuid('a1', 2), name: 'Tobias Renwick' },
} as const;

const ATMOSPHERE_PA = 96_000;
const FACTS = {
  refrigerant: 'R-448A',
  atmospherePaAbs: ATMOSPHERE_PA,
  elevationM: 452,
  unitSystem: 'us' as const,
};
const fahrenheit = (value: number): number => ((value + 459.67) * 5) / 9;
export const both = (en: string, es: string): { en: string; es: string } => ({ en, es });

export const SIGNATURE: Signature = {
  printedName: 'Marisol Quintero',
  width: 600,
  height: 180,
  strokes: [
    Array.from({ length: 80 }, (_, i) => [
      30 + i * 5,
      100 + Math.sin(i / 3.1) * 45 * Math.exp(-i / 70),
    ]).flat(),
    [420, 120, 470, 60, 500, 130, 560, 70],
  ],
  typed: false,
};

export function stepList(number: number): StepList {
  const fixtureId = uuid('f1', number);
  const base = { instruction: null, caution: null, fixtureId, coilId: null, required: true, source: null };
  const none = { ...base, fixtureId: null };
  const steps: unknown[] = [
    {
      ...base,
      kind: 'confirm',
      key: 'fans',
      section: 'before',
      title: both(
        'All fans run and blow into the case',
        'Todos los ventiladores giran y soplan hacia la vitrina',
      ),
      instruction: both(
        'Feel the air at every fan with the door or curtain as in service.',
        'Sienta el aire en cada ventilador con la puerta o cortina como en servicio.',
      ),
    },
    {
      ...base,
      kind: 'choose',
      key: 'drain',
      section: 'before',
      title: both('Drain line', 'Línea de drenaje'),
      options: [
        {
          value: 'clear',
          label: both('Runs clear, trap filled', 'Corre libre, trampa llena'),
          outcome: 'within',
        },
        { value: 'slow', label: both('Slow or dry', 'Lenta o seca'), outcome: 'outside' },
      ],
    },
    {
      ...none,
      kind: 'override',
      key: 'hold',
      section: 'before',
      title: both('Hold the defrost off', 'Retener el deshielo'),
      subject: both('Defrost held off', 'Deshielo retenido'),
    },
    {
      ...base,
      kind: 'reading',
      key: 'air',
      section: 'readings',
      title: both('Discharge air at the honeycomb', 'Aire de descarga en el panal'),
      dimension: 'temperature',
      limits: { low: fahrenheit(24), high: fahrenheit(30) },
      siUnit: 'K',
      source: 'Fixture specification',
    },
    {
      ...base,
      kind: 'reading',
      key: 'fanAmps',
      section: 'readings',
      title: both('Evaporator fan current', 'Corriente de ventiladores'),
      dimension: 'electricCurrent',
      limits: { low: null, high: 2.4 },
      siUnit: 'A',
      source: 'Nameplate',
    },
    {
      ...base,
      kind: 'reading',
      key: 'length',
      section: 'readings',
      title: both('Length of the drip leg', 'Longitud del tramo de goteo'),
      dimension: 'length',
      limits: { low: null, high: null },
      siUnit: 'm',
    },
    {
      ...base,
      kind: 'superheat',
      key: 'superheat',
      coilId: uuid('c1', number),
      section: 'readings',
      title: both('Superheat of the coil', 'Recalentamiento del serpentín'),
      band: { lowK: 10 / 3, highK: 50 / 9 },
      source: 'Fixture specification',
    },
    {
      ...base,
      kind: 'confirm',
      key: 'heater',
      section: 'readings',
      title: both('Door heater draws current', 'La resistencia de puerta toma corriente'),
      required: false,
    },
    {
      ...base,
      kind: 'photo',
      key: 'photos',
      section: 'proof',
      title: both('Valve, bulb and strap in one picture', 'Válvula, bulbo y abrazadera en una imagen'),
      minCount: 1,
    },
    {
      ...none,
      kind: 'note',
      key: 'note',
      section: 'proof',
      title: both('Anything the next person must know', 'Lo que debe saber quien sigue'),
      required: false,
    },
    {
      ...none,
      kind: 'signature',
      key: 'signature',
      section: 'proof',
      title: both('Signature', 'Firma'),
      meaning: both(
        'I did this work and recorded what I found.',
        'Hice este trabajo y registré lo que encontré.',
      ),
    },
  ];
  return stepListSchema.parse({
    format: 1,
    template: { key: 'case', version: 4, title: both('Display case on a rack', 'Vitrina en un rack') },
    facts: FACTS,
    sections: [
      { key: 'before', title: both('Before refrigeration', 'Antes de refrigerar') },
      { key: 'readings', title: both('Readings at steady state', 'Lecturas en régimen') },
      { key: 'proof', title: both('Proof and signature', 'Prueba y firma') },
    ],
    steps,
  });
}

export function specification(number: number, code: string, description: string): CircuitSpecification {
  return {
    revision: 2,
    opening: { id: uuid('01', 1), name: 'Willow Bend', elevationM: 452, unitSystem: 'us' },
    system: { id: uuid('51', 1), name: 'Rack A', kind: 'rack', refrigerant: 'R-448A' },
    suctionGroup: {
      id: uuid('56', 1),
      name: 'A, medium',
      temperatureClass: 'medium',
      saturatedSuctionTemperatureK: fahrenheit(18),
    },
    circuit: {
      id: uuid('c0', number),
      code,
      description,
      area: 'Dairy wall',
      temperatureClass: 'medium',
      feed: 'homeRun',
      control: 'evaporatorPressureRegulator',
      loadW: 8400,
      defrost: {
        type: 'offTime',
        perDay: 4,
        failSafeS: 2700,
        terminationTemperatureK: fahrenheit(45),
        dripS: null,
      },
      fixtures: [
        {
          id: uuid('f1', number),
          tag: `${code}-1`,
          description: 'Multideck, five shelves',
          kind: 'case',
          lengthM: 3.66,
          evaporatingTemperatureK: fahrenheit(21),
          evaporatingBasis: 'dew',
          dischargeAirTemperatureK: fahrenheit(27),
          superheatLowK: 10 / 3,
          superheatHighK: 50 / 9,
          valveKind: 'thermostatic',
          coils: [{ id: uuid('c1', number), number: 1 }],
        },
      ],
    },
  } as unknown as CircuitSpecification;
}
