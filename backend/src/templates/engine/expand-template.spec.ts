import { describe, expect, it } from '@jest/globals';
import type { StepList } from '#shared/checklist/step';
import { DomainFailure } from '#shared/failures/failure';
import { SAFETY_CLASSES } from '#shared/refrigeration/saturation/saturation-table';
import { canonicalJson } from '#shared/sequences/canonical-json';
import {
  classedTable,
  COIL_A1,
  COIL_B1,
  COIL_B2,
  FIXTURE_A,
  FIXTURE_B,
  specificationWith,
} from './circuit-specification.fixture';
import { expandTemplate } from './expand-template';
import { parseTemplate } from './parse-template';
import { CONFIRM, stepText, templateText } from './written-template.fixture';

type Changes = Parameters<typeof specificationWith>[0];

function expand(source: string, changes: Changes = {}): StepList {
  return expandTemplate(parseTemplate(source, 'trial.yaml'), specificationWith(changes));
}

function stepsOf(...steps: string[]): string {
  return templateText({ steps: steps.join('\n') });
}

function refusal(source: string, changes: Changes = {}): DomainFailure {
  const template = parseTemplate(source, 'trial.yaml');
  try {
    expandTemplate(template, specificationWith(changes));
  } catch (error) {
    if (error instanceof DomainFailure) return error;
    throw error;
  }
  throw new Error('It was expanded.');
}

const source = 'source: Common practice';

describe('expandTemplate', () => {
  it('repeats neighbours together, fixture by fixture and coil by coil', () => {
    const list = expand(
      stepsOf(
        CONFIRM,
        stepText('kind: confirm', 'key: fans', 'for_each: fixture'),
        stepText('kind: confirm', 'key: drain', 'for_each: fixture'),
        stepText('kind: superheat', 'key: sh', 'for_each: coil', source),
        stepText('kind: note', 'key: words'),
      ),
    );
    expect(list.steps.map((step) => step.key)).toEqual([
      'look',
      `fans:${FIXTURE_A}`,
      `drain:${FIXTURE_A}`,
      `fans:${FIXTURE_B}`,
      `drain:${FIXTURE_B}`,
      `sh:${COIL_A1}`,
      `sh:${COIL_B1}`,
      `sh:${COIL_B2}`,
      'words',
    ]);
    expect(list.steps[6]).toMatchObject({ fixtureId: FIXTURE_B, coilId: COIL_B1, section: 'first' });
    expect(list.steps[1]).toMatchObject({ fixtureId: FIXTURE_A, coilId: null });
    expect(list.steps[0]).toMatchObject({ fixtureId: null, coilId: null });
  });

  it('keeps the facts that judging needs', () => {
    const { facts, template, format } = expand(templateText(), {
      opening: { elevationM: 1609.344, unitSystem: 'si' },
    });
    expect(format).toBe(1);
    expect(template).toEqual({ key: 'trial', version: 3, title: { en: 'Trial', es: 'Prueba' } });
    expect(facts).toMatchObject({ refrigerant: 'R-448A', elevationM: 1609.344, unitSystem: 'si' });
    expect(facts.atmospherePaAbs / 1000).toBeCloseTo(83.43, 1);
  });

  describe('asks for the flammability step by the safety class', () => {
    const text = stepsOf(
      stepText('kind: confirm', 'key: flammable-ready', `when: 'system.safetyClass != "A1"'`),
      CONFIRM,
    );
    const keysOf = (refrigerant: string, table?: ReturnType<typeof classedTable>) =>
      expandTemplate(
        parseTemplate(text, 'trial.yaml'),
        specificationWith({ system: { refrigerant } }),
        table,
      ).steps.map(({ key }) => key);

    // Shipped tables: R-448A and R-744 are A1, R-32 A2L, R-290 A3 (ANSI/ASHRAE Standard 34).
    it.each([
      ['R-448A', []],
      ['R-744', []],
      ['R-32', ['flammable-ready']],
      ['R-290', ['flammable-ready']],
    ])('of the program’s own %s', (refrigerant, asked) => {
      expect(keysOf(refrigerant)).toEqual([...asked, 'look']);
    });

    it.each(SAFETY_CLASSES)('of a maker’s table that says %s', (safetyClass) => {
      const keys = keysOf('R-9X1', classedTable('R-9X1', safetyClass));
      expect(keys).toEqual(safetyClass === 'A1' ? ['look'] : ['flammable-ready', 'look']);
    });

    it('of the maker’s table before the program’s own', () => {
      expect(keysOf('R-448A', classedTable('R-448A', 'A2L'))).toEqual(['flammable-ready', 'look']);
      // Entered by a slip: what is known to burn keeps its step.
      expect(keysOf('R-290', classedTable('R-290', 'A1'))).toEqual(['flammable-ready', 'look']);
    });

    it('also where nobody knows the class', () => {
      expect(keysOf('R-9X1')).toEqual(['flammable-ready', 'look']);
    });
  });

  it('gives the same bytes twice', () => {
    const text = stepsOf(stepText('kind: superheat', 'key: sh', 'for_each: coil', source), CONFIRM);
    expect(canonicalJson(expand(text))).toBe(canonicalJson(expand(text)));
  });

  it('does not change the specification', () => {
    const specification = specificationWith();
    const before = canonicalJson(specification);
    expandTemplate(parseTemplate(templateText(), 'trial.yaml'), specification);
    expect(canonicalJson(specification)).toBe(before);
  });

  it('works limits out per fixture and turns fixed ones into SI', () => {
    const list = expand(
      stepsOf(
        stepText(
          'kind: reading',
          'key: air',
          'for_each: fixture',
          'dimension: temperature',
          'limits: { low: fixture.dischargeAirTemperatureK - differenceF(1.8), high: 41 °F }',
          source,
        ),
        stepText('kind: reading', 'key: share', 'dimension: ratio', 'limits: { high: 55 % }', source),
        stepText('kind: reading', 'key: amps', 'dimension: electricCurrent'),
      ),
    );
    const [air, , share, amps] = list.steps;
    if (air?.kind !== 'reading' || share?.kind !== 'reading') throw new Error('These are readings.');
    expect(air.siUnit).toBe('K');
    expect(air.limits.low).toBeCloseTo(271.5, 9);
    expect(air.limits.high).toBeCloseTo(278.15, 9);
    expect(share).toMatchObject({ siUnit: 'fraction', limits: { low: null, high: 0.55 } });
    expect(amps).toMatchObject({ siUnit: 'A', limits: { low: null, high: null } });
  });

  it("takes the fixture's superheat band unless the template has its own", () => {
    const list = expand(
      stepsOf(
        stepText('kind: superheat', 'key: a', 'for_each: coil', source),
        stepText(
          'kind: superheat',
          'key: b',
          'for_each: coil',
          source,
          'band: { low: 3 K, high: fixture.superheatHighK }',
        ),
      ),
    );
    expect(list.steps[0]).toMatchObject({ band: { lowK: 3.5, highK: 4.5 } });
    expect(list.steps[1]).toMatchObject({ band: { lowK: 3, highK: 4.5 } });
  });

  it('leaves out steps and sections whose condition does not hold', () => {
    const steps = [
      stepText('kind: confirm', 'key: a', 'when: circuit.defrost.type == "electric"'),
      CONFIRM,
    ].join('\n');
    const later = [
      '  - key: later',
      '    title: { en: L, es: L }',
      '    when: circuit.hasWalkIn',
      '    steps:',
      CONFIRM.replace('look', 'z'),
    ];
    const list = expand(templateText({ steps }) + later.join('\n'));
    expect(list.steps.map((step) => step.key)).toEqual(['look']);
    expect(list.sections.map((section) => section.key)).toEqual(['first']);
  });

  it('fills placeholders in both languages, once, whatever the schedule says', () => {
    const text = templateText({
      steps: stepText('kind: confirm', 'key: a', 'for_each: coil').replace(
        '{ en: Look, es: Mire }',
        '{ en: "{{fixture.tag}}, coil {{ coil.number }}", es: "{{fixture.tag}}, serpentín {{coil.number}}" }',
      ),
    });
    expect(expand(text).steps[2]?.title).toEqual({ en: 'D-2, coil 2', es: 'D-2, serpentín 2' });
    const odd = expand(text, { fixtures: { tag: '$& {{circuit.code}}' } });
    expect(odd.steps[2]?.title.en).toBe('$& {{circuit.code}}, coil 2');
  });

  it('carries what each kind of step needs', () => {
    const list = expand(
      stepsOf(
        stepText('kind: photo', 'key: a', 'min_count: 2'),
        stepText(
          'kind: override',
          'key: b',
          'subject: { en: "{{circuit.code}} held", es: "{{circuit.code}} detenido" }',
        ),
        stepText('kind: signature', 'key: c', 'meaning: { en: Done, es: Hecho }'),
        stepText('kind: note', 'key: d', 'required: false'),
        stepText(
          'kind: choose',
          'key: e',
          source,
          'options:',
          '  - { value: y, label: { en: Y, es: S }, outcome: within }',
          '  - { value: n, label: { en: N, es: N }, outcome: outside }',
        ),
        stepText(
          'kind: confirm',
          'key: f',
          'caution: { hazard: cold, text: { en: C, es: F } }',
          'instruction: { en: I, es: I }',
        ),
      ),
    );
    expect(list.steps).toMatchObject([
      { kind: 'photo', minCount: 2, required: true, source: null, caution: null, instruction: null },
      { kind: 'override', subject: { en: 'A07 held', es: 'A07 detenido' } },
      { kind: 'signature', meaning: { en: 'Done', es: 'Hecho' } },
      { kind: 'note', required: false },
      {
        kind: 'choose',
        source: 'Common practice',
        options: [{ value: 'y', outcome: 'within' }, { value: 'n' }],
      },
      {
        kind: 'confirm',
        caution: { hazard: 'cold', text: { en: 'C', es: 'F' } },
        instruction: { en: 'I', es: 'I' },
      },
    ]);
  });
});

describe('expandTemplate refuses', () => {
  it('limits that cross for the circuit', () => {
    const limits = 'limits: { low: fixture.dischargeAirTemperatureK, high: fixture.evaporatingTemperatureK }';
    const failure = refusal(
      stepsOf(
        stepText('kind: reading', 'key: a', 'for_each: fixture', 'dimension: temperature', limits, source),
      ),
    );
    expect(failure.code).toBe('templateRefused');
    expect(failure.places[0]?.path).toBe('trial.yaml:16:24');
    expect(failure.places[0]?.message).toMatch(/^The low limit lies above the high one for this circuit/);
  });

  it("a fixture's band that is upside down", () => {
    const failure = refusal(stepsOf(stepText('kind: superheat', 'key: a', 'for_each: coil', source)), {
      fixtures: { superheatLowK: 6, superheatHighK: 3 },
    });
    expect(failure.message).toMatch(/superheat band of D-1 has its low end above its high end/);
  });

  it('an expression without a finite value', () => {
    const limits = 'limits: { high: fixture.dischargeAirTemperatureK + differenceF(1.0) / 0.0 }';
    const failure = refusal(
      stepsOf(
        stepText('kind: reading', 'key: a', 'for_each: fixture', 'dimension: temperature', limits, source),
      ),
    );
    expect(failure.places[0]?.message).toMatch(/^This gives no finite limit for the circuit/);
  });

  it('a value that the schedule leaves out although it was asked for', () => {
    const when = 'when: circuit.hasWalkIn == circuit.defrost.hasTerminationTemperature';
    const limits = 'limits: { high: circuit.defrost.terminationTemperatureK }';
    const failure = refusal(
      stepsOf(stepText('kind: reading', 'key: a', 'dimension: temperature', when, limits, source)),
    );
    expect(failure.places[0]?.path).toBe('trial.yaml:16:25');
    expect(failure.places[0]?.message).toMatch(
      /^This has no value for the circuit: the schedule leaves this value out/,
    );
  });

  it('a circuit for which no step is left', () => {
    const failure = refusal(stepsOf(stepText('kind: confirm', 'key: a', 'when: circuit.hasWalkIn')));
    expect(failure.message).toMatch(/None of the steps is there for A07/);
  });

  it('more than 2,000 steps, and takes exactly 2,000', () => {
    const template = parseTemplate(
      stepsOf(stepText('kind: confirm', 'key: a', 'for_each: coil')),
      'trial.yaml',
    );
    const withCoils = (count: number) => {
      const specification = specificationWith();
      const [fixture] = specification.circuit.fixtures;
      const coil = fixture?.coils[0];
      if (!fixture || !coil) throw new Error('The specification has no coil.');
      const coils = Array.from({ length: count }, (_unused, index) => ({ ...coil, number: index + 1 }));
      return { ...specification, circuit: { ...specification.circuit, fixtures: [{ ...fixture, coils }] } };
    };
    expect(expandTemplate(template, withCoils(2000)).steps).toHaveLength(2000);
    expect(() => expandTemplate(template, withCoils(2001))).toThrow(/more than 2000 steps/);
  });

  it('an elevation without a standard atmosphere', () => {
    const failure = refusal(templateText(), { opening: { elevationM: 20_000 } });
    expect(failure.code).toBe('invalidInput');
    expect(failure.places[0]?.path).toBe('opening.elevationM');
  });
});
