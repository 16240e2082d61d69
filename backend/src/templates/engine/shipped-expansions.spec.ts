import { join } from 'node:path';
import { describe, expect, it } from '@jest/globals';
import type { Step } from '#shared/checklist/step';
import {
  COIL_A1,
  COIL_B1,
  COIL_B2,
  FIXTURE_A,
  FIXTURE_B,
  specificationWith,
} from './circuit-specification.fixture';
import { chooseTemplate } from './choose-template';
import { expandTemplate } from './expand-template';
import { loadShippedTemplates } from './load-shipped-templates';

const documents = loadShippedTemplates(join(__dirname, '../../../../templates')).map(
  ({ document }) => document,
);

const SHORT: Readonly<Record<string, string>> = {
  [FIXTURE_A]: 'A',
  [FIXTURE_B]: 'B',
  [COIL_A1]: 'A1',
  [COIL_B1]: 'B1',
  [COIL_B2]: 'B2',
};

/** `kind key`, with the fixture or coil that a step is repeated for. */
function shortOf(step: Step): string {
  const [key, id] = step.key.split(':');
  return `${step.kind} ${key ?? ''}${id === undefined ? '' : ` ${SHORT[id] ?? id}`}`;
}

interface Expansion {
  readonly key: string;
  readonly changes: Parameters<typeof specificationWith>[0];
  readonly steps: readonly string[];
}

/** What each shipped template makes of a circuit with fixture A of one coil and fixture B of two. */
const EXPANSIONS: readonly Expansion[] = [
  {
    key: 'medium-temperature-cases',
    changes: {},
    steps: [
      'confirm right-circuit',
      'reading store-air',
      'reading store-humidity',
      'photo clean-photo A',
      'confirm fans A',
      'choose drain A',
      'photo clean-photo B',
      'confirm fans B',
      'choose drain B',
      'confirm suction-ready',
      'override defrost-held',
      'reading since-defrost',
      'reading regulator-set',
      'superheat superheat A1',
      'superheat superheat B1',
      'superheat superheat B2',
      'choose regulator-again',
      'confirm caps-and-bulbs',
      'confirm defrost-settings',
      'choose after-defrost',
      'reading discharge-air A',
      'reading discharge-air B',
      'note remarks',
      'signature installer-signature',
    ],
  },
  {
    key: 'low-temperature-electric-defrost',
    changes: {
      circuit: { temperatureClass: 'low' },
      defrost: { type: 'electric', terminationTemperatureK: 285.0 },
    },
    steps: [
      'confirm right-circuit',
      'photo clean-photo A',
      'confirm fans A',
      'choose drain A',
      'choose doors A',
      'reading heater-amps A',
      'reading anti-sweat-amps A',
      'photo clean-photo B',
      'confirm fans B',
      'choose drain B',
      'choose doors B',
      'reading heater-amps B',
      'reading anti-sweat-amps B',
      'confirm suction-ready',
      'override defrost-held',
      'reading since-defrost',
      'reading regulator-set',
      'superheat superheat A1',
      'superheat superheat B1',
      'superheat superheat B2',
      'choose regulator-again',
      'confirm caps-and-bulbs',
      'confirm defrost-settings',
      'reading defrost-end-temperature',
      'reading defrost-duration',
      'choose after-defrost',
      'reading discharge-air A',
      'reading discharge-air B',
      'note remarks',
      'signature installer-signature',
    ],
  },
  {
    key: 'low-temperature-hot-gas-defrost',
    changes: {
      circuit: { temperatureClass: 'low' },
      defrost: { type: 'hotGas', terminationTemperatureK: 285.0 },
    },
    steps: [
      'confirm right-circuit',
      'photo clean-photo A',
      'confirm fans A',
      'choose doors A',
      'photo clean-photo B',
      'confirm fans B',
      'choose doors B',
      'confirm suction-ready',
      'override defrost-held',
      'reading since-defrost',
      'reading regulator-set',
      'superheat superheat A1',
      'superheat superheat B1',
      'superheat superheat B2',
      'confirm caps-and-bulbs',
      'confirm gas-valves',
      'confirm defrost-settings',
      'reading defrost-end-temperature',
      'reading defrost-duration',
      'choose after-defrost',
      'choose back-to-cold',
      'reading discharge-air A',
      'reading discharge-air B',
      'note remarks',
      'signature installer-signature',
    ],
  },
  {
    key: 'walk-in-cooler',
    changes: { circuit: { control: 'liquidSolenoid' }, fixtures: { kind: 'walkIn' } },
    steps: [
      'confirm right-circuit',
      'choose inside-release A',
      'choose box-door A',
      'photo clean-photo A',
      'confirm fans A',
      'choose inside-release B',
      'choose box-door B',
      'photo clean-photo B',
      'confirm fans B',
      'confirm suction-ready',
      'choose pump-down',
      'override defrost-held',
      'reading since-defrost',
      'superheat superheat A1',
      'superheat superheat B1',
      'superheat superheat B2',
      'confirm caps-and-bulbs',
      'confirm defrost-settings',
      'choose after-defrost',
      'reading discharge-air A',
      'reading discharge-air B',
      'reading product-temperature',
      'note remarks',
      'signature installer-signature',
    ],
  },
  {
    key: 'walk-in-freezer',
    changes: {
      circuit: { control: 'liquidSolenoid', temperatureClass: 'low' },
      fixtures: { kind: 'walkIn' },
      defrost: { type: 'electric', terminationTemperatureK: 285.0 },
    },
    steps: [
      'confirm right-circuit',
      'choose inside-release A',
      'choose box-door A',
      'photo clean-photo A',
      'confirm fans A',
      'reading heater-amps A',
      'choose inside-release B',
      'choose box-door B',
      'photo clean-photo B',
      'confirm fans B',
      'reading heater-amps B',
      'confirm suction-ready',
      'choose pump-down',
      'override defrost-held',
      'reading since-defrost',
      'superheat superheat A1',
      'superheat superheat B1',
      'superheat superheat B2',
      'confirm caps-and-bulbs',
      'confirm defrost-settings',
      'reading defrost-end-temperature',
      'reading defrost-duration',
      'choose after-defrost',
      'reading discharge-air A',
      'reading discharge-air B',
      'note remarks',
      'signature installer-signature',
    ],
  },
  {
    key: 'electronic-valves',
    changes: { circuit: { control: 'electronicValve' }, fixtures: { valveKind: 'electronic' } },
    steps: [
      'confirm right-circuit',
      'photo clean-photo A',
      'confirm fans A',
      'photo clean-photo B',
      'confirm fans B',
      'confirm driver-set',
      'choose transducer',
      'reading outlet-sensor A',
      'reading outlet-sensor B',
      'confirm suction-ready',
      'override defrost-held',
      'reading since-defrost',
      'superheat superheat-electronic A1',
      'superheat superheat-electronic B1',
      'superheat superheat-electronic B2',
      'choose valve-openings',
      'confirm caps-and-bulbs',
      'confirm defrost-settings',
      'choose after-defrost',
      'reading discharge-air A',
      'reading discharge-air B',
      'note remarks',
      'signature installer-signature',
    ],
  },
  {
    key: 'plain-circuit',
    changes: {
      circuit: { temperatureClass: 'low', control: 'suctionStop' },
      defrost: { type: 'none', perDay: 0 },
    },
    steps: [
      'confirm right-circuit',
      'photo clean-photo A',
      'confirm fans A',
      'choose drain A',
      'photo clean-photo B',
      'confirm fans B',
      'choose drain B',
      'confirm suction-ready',
      'superheat superheat A1',
      'superheat superheat B1',
      'superheat superheat B2',
      'confirm caps-and-bulbs',
      'reading discharge-air A',
      'reading discharge-air B',
      'note remarks',
      'signature installer-signature',
    ],
  },
];

describe('the shipped templates', () => {
  it.each(EXPANSIONS)('make the steps of $key', ({ key, changes, steps }) => {
    const specification = specificationWith(changes);
    const template = chooseTemplate(documents, specification);
    if (!template) throw new Error('No template applies.');
    expect(template.key).toBe(key);
    expect(expandTemplate(template, specification).steps.map(shortOf)).toEqual(steps);
  });

  it('have an expansion here each', () => {
    expect(EXPANSIONS.map(({ key }) => key).sort()).toEqual(documents.map(({ key }) => key).sort());
  });

  it('take limits from the schedule', () => {
    const specification = specificationWith({
      circuit: { temperatureClass: 'low' },
      defrost: { type: 'electric', terminationTemperatureK: 283.15, failSafeS: 2700 },
    });
    const template = chooseTemplate(documents, specification);
    if (!template) throw new Error('No template applies.');
    const readings = new Map<string, { low: number | null; high: number | null }>();
    for (const step of expandTemplate(template, specification).steps) {
      if (step.kind === 'reading') readings.set(step.key, step.limits);
    }
    const air = readings.get(`discharge-air:${FIXTURE_A}`);
    expect(air?.low).toBeCloseTo(272.5 - 10 / 9, 9);
    expect(air?.high).toBeCloseTo(272.5 + 10 / 9, 9);
    const end = readings.get('defrost-end-temperature');
    expect(end?.low).toBeCloseTo(283.15 - 25 / 9, 9);
    expect(end?.high).toBeCloseTo(283.15 + 25 / 9, 9);
    expect(readings.get('defrost-duration')).toEqual({ low: null, high: 2640 });
    expect(readings.get('since-defrost')).toEqual({ low: 3600, high: null });
  });

  it('work hot gas through on every circuit that defrosts by it', () => {
    for (const changes of [
      {},
      { fixtures: { kind: 'walkIn' } },
      { fixtures: { valveKind: 'electronic' } },
    ] as const) {
      for (const temperatureClass of ['low', 'medium'] as const) {
        const specification = specificationWith({
          ...changes,
          circuit: { temperatureClass },
          defrost: { type: 'hotGas' },
        });
        const template = chooseTemplate(documents, specification);
        if (!template) throw new Error('No template applies.');
        const steps = expandTemplate(template, specification).steps.map(shortOf);
        expect(steps).toContain('confirm gas-valves');
        expect(steps.indexOf('choose back-to-cold')).toBeGreaterThan(steps.indexOf('choose after-defrost'));
      }
    }
  });

  it('ask only a box for its door when a case hangs on the same circuit', () => {
    const specification = specificationWith();
    const [box, other] = specification.circuit.fixtures;
    if (!box || !other) throw new Error('Two fixtures are needed.');
    const fixtures = [{ ...box, kind: 'walkIn' as const }, other];
    const mixed = { ...specification, circuit: { ...specification.circuit, fixtures } };
    const template = chooseTemplate(documents, mixed);
    if (!template) throw new Error('No template applies.');
    const steps = expandTemplate(template, mixed).steps.map(shortOf);
    expect(steps).toContain('choose inside-release A');
    expect(steps).not.toContain('choose inside-release B');
    expect(steps).toContain('confirm fans B');
  });
});
