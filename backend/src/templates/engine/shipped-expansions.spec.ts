import { join } from 'node:path';
import { describe, expect, it } from '@jest/globals';
import type { Step } from '#shared/checklist/step';
import type { Level } from '#shared/plant/words';
import {
  atLevel,
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
import { EXPANSIONS } from './shipped-expansions.fixture';

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

describe('the shipped templates', () => {
  it.each(EXPANSIONS)('make the steps of $key', ({ key, level = 'circuit', changes, steps }) => {
    const specification = atLevel(level, specificationWith(changes));
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
    const steps = new Map(expandTemplate(template, specification).steps.map((step) => [step.key, step]));
    const limitsOf = (key: string) => {
      const step = steps.get(key);
      return step?.kind === 'reading' ? step.limits : null;
    };
    const air = limitsOf(`discharge-air:${FIXTURE_A}`);
    expect(air?.low).toBeCloseTo(272.5 - 10 / 9, 9);
    expect(air?.high).toBeCloseTo(272.5 + 10 / 9, 9);
    expect(limitsOf('since-defrost')).toEqual({ low: 3600, high: null });
    const defrost = steps.get('witnessed-defrost');
    expect(defrost?.kind === 'measurement' && defrost.criteria).toEqual({
      failSafe: 2700,
      terminationTemperature: 283.15,
      temperatureTolerance: expect.closeTo(25 / 9, 9),
    });
    const held = steps.get(`air-held:${FIXTURE_A}`);
    expect(held).toMatchObject({ kind: 'trend', required: false, holdS: 86_400, longestExcursionS: 3600 });
    expect(held?.kind === 'trend' && [held.bandLowK, held.bandHighK]).toEqual([
      expect.closeTo(272.5 - 25 / 9, 9),
      expect.closeTo(272.5 + 25 / 9, 9),
    ]);
  });

  it.each([
    [{ failSafeS: 2700, terminationTemperatureK: null }, 'measurement timed-defrost'],
    [{ failSafeS: null, terminationTemperatureK: 283.15 }, 'reading defrost-end-temperature'],
    [{ failSafeS: null, terminationTemperatureK: null }, null],
  ])('watch a defrost by what the schedule says of it: %j', (defrost, step) => {
    const specification = specificationWith({
      circuit: { temperatureClass: 'low' },
      defrost: { type: 'electric', ...defrost },
    });
    const template = chooseTemplate(documents, specification);
    if (!template) throw new Error('No template applies.');
    const watched = expandTemplate(template, specification)
      .steps.map(shortOf)
      .filter((name) => /(witnessed|timed)-defrost|defrost-end/.test(name));
    expect(watched).toEqual(step === null ? [] : [step]);
  });

  it('test pressure, vacuum and return gas by the figures that their sources give', () => {
    const criteria = (level: Level, key: string) => {
      const specification = atLevel(level, specificationWith());
      const template = chooseTemplate(documents, specification);
      const step = template && expandTemplate(template, specification).steps.find((each) => each.key === key);
      return step?.kind === 'measurement' ? step.criteria : null;
    };
    // 300 µm Hg, and no more than 500 µm Hg an hour later: UFGS 15182. 1 µm Hg is 101325/760000 Pa.
    expect(criteria('system', 'rise-test')).toEqual({
      target: expect.closeTo(39.99671, 5),
      hold: 3600,
      limit: expect.closeTo(66.66118, 5),
    });
    // 24 h without loss: UFGS 15182; 300 psi on the high side, 150 psi on the low: UFGS 15741N.
    expect(criteria('system', 'high-side-test')).toEqual({
      leastHold: 86_400,
      leastPressure: expect.closeTo(300 * 6894.757293, 3),
      allowedLoss: 0,
    });
    expect(criteria('system', 'low-side-test')?.['leastPressure']).toBeCloseTo(150 * 6894.757293, 3);
    // Within a tenth of the plate: NEMA MG 1, 12.44; 2 % of unbalance: common practice.
    expect(criteria('system', 'supply-voltage')).toEqual({ tolerance: 0.1, greatestUnbalance: 0.02 });
    expect(criteria('suctionGroup', 'return-gas')).toEqual({ superheatLow: 10 });
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
