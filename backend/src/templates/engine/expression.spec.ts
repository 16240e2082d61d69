import { describe, expect, it } from '@jest/globals';
import { DomainFailure } from '#shared/failures/failure';
import { compileExpression, ExpressionFailure, LONGEST_EXPRESSION, type Wanted } from './expression';
import type { Scope } from './fact-fields';
import { specificationWith } from './circuit-specification.fixture';
import { parseTemplate } from './parse-template';
import { sizeOf } from './quantity-facts';
import { specificationFacts, coilFacts, fixtureFacts } from './specification-facts';
import { stepText, templateText } from './written-template.fixture';

function refusals(text: string, scope: Scope = 'circuit', wanted: Wanted = 'bool'): [number, string][] {
  const compiled = compileExpression(text, scope, wanted);
  return compiled.ok ? [] : compiled.problems.map(({ index, sentence }) => [index, sentence]);
}

function valueOf(text: string, wanted: Wanted = 'bool', specification = specificationWith()): unknown {
  const [fixture] = specification.circuit.fixtures;
  const [coil] = fixture?.coils ?? [];
  if (!fixture || !coil) throw new Error('The specification has no coil.');
  const compiled = compileExpression(text, 'coil', wanted);
  if (!compiled.ok) throw new Error(JSON.stringify(compiled.problems));
  return compiled.expression.evaluate({
    ...specificationFacts(specification),
    fixture: fixtureFacts(fixture),
    coil: coilFacts(coil),
  });
}

describe('compileExpression', () => {
  it.each([
    ['circuit.defrost.type == "offTime" && circuit.defrost.perDay > 2', true],
    ['circuit.temperatureClass in ["low", "high"]', false],
    ['circuit.fixtures.exists(each, each.valveKind == "electronic")', false],
    ['circuit.fixtures.all(each, size(each.coils) >= 1)', true],
    ['circuit.hasWalkIn || circuit.hasElectronicValve', false],
    ['fixture.tag.startsWith("D-") && coil.number == 1', true],
    ['fixture.dischargeAirTemperatureK < temperatureF(32)', true],
    ['fixture.dischargeAirTemperatureK - fixture.evaporatingTemperatureK > differenceF(10.0)', true],
    ['opening.elevationM > lengthFt(900)', true],
    ['circuit.defrost.hasFailSafe && circuit.defrost.failSafeS >= durationMin(45)', true],
    ['circuit.defrost.hasDrip ? circuit.defrost.dripS > durationMin(1) : true', true],
  ])('answers %s', (text, expected) => {
    expect(valueOf(text)).toBe(expected);
  });

  it('gives a temperature from a temperature and a difference, in kelvin', () => {
    const value = valueOf('fixture.dischargeAirTemperatureK + differenceF(1.8)', 'Temperature');
    expect(sizeOf('temperature', value)).toBeCloseTo(273.5, 9);
  });

  it('scales a difference', () => {
    const value = valueOf('(fixture.superheatHighK - fixture.superheatLowK) / 2.0', 'TemperatureDifference');
    expect(sizeOf('temperatureDifference', value)).toBeCloseTo(0.5, 9);
  });

  it('fails on a value that the schedule leaves out, and never answers "no"', () => {
    expect(() => valueOf('circuit.loadW > heatFlowW(1)')).toThrow(ExpressionFailure);
  });
});

describe('compileExpression refuses', () => {
  it.each<[what: string, text: string, index: number, sentence: RegExp]>([
    [
      'the sum of two temperatures',
      'temperatureF(1) + temperatureF(2) > temperatureF(3)',
      0,
      /Two temperatures can't be added/,
    ],
    [
      'a temperature against a difference',
      'temperatureF(1) > differenceF(2)',
      0,
      /don't go together: Temperature > TemperatureDifference/,
    ],
    [
      'a temperature against a bare number',
      'suctionGroup.saturatedSuctionTemperatureK > 260.0',
      0,
      /Temperature > double/,
    ],
    ['equal quantities', 'temperatureF(1) == temperatureF(1)', 0, /never exactly equal/],
    ['a scaled temperature', 'temperatureF(1) * 2.0 > temperatureF(1)', 0, /Temperature \* double/],
    ['a pattern', 'circuit.code.matches("^(a+)+$")', 0, /`matches` is not available/],
    [
      'a pattern in a loop',
      'circuit.fixtures.exists(f, f.tag.matches("a"))',
      27,
      /`matches` is not available/,
    ],
    [
      'a loop within a loop',
      'circuit.fixtures.all(f, circuit.fixtures.all(g, true))',
      24,
      /can't stand inside/,
    ],
    [
      'an unknown name',
      'circuit.hasWalkIn && cirquit.hasWalkIn',
      21,
      /Unknown variable: cirquit. This place knows opening, system/,
    ],
    ['an unknown fact', 'circuit.colour == "red"', 8, /no such fact: colour/],
    ['an unknown function', 'sin(1.0) > 0.0', 0, /`sin` is not available/],
    ['a fixture outside a fixture', 'fixture.tag == "D-1"', 0, /Unknown variable: fixture/],
    ['a way around the types', 'dyn(temperatureF(1)) == 1', 0, /`dyn` is not available/],
    ['a look-up by text', 'circuit["code"] == "A"', 0, /`\[\]` is not available/],
    ['half an expression', 'circuit.hasWalkIn &&', 20, /can't be read as an expression/],
    [
      'a number as a condition',
      'circuit.defrost.perDay',
      0,
      /gives a whole number, where true or false is needed/,
    ],
    [
      'what is too long',
      `"${'x'.repeat(LONGEST_EXPRESSION)}" == ""`,
      0,
      /at most 500 characters; this one has 508/,
    ],
  ])('%s', (_what, text, index, sentence) => {
    const [first] = refusals(text);
    expect(first?.[0]).toBe(index);
    expect(first?.[1]).toMatch(sentence);
  });

  it('a difference where a temperature is needed', () => {
    expect(refusals('differenceF(2)', 'circuit', 'Temperature')).toEqual([
      [0, 'This gives a temperature difference, where a temperature is needed.'],
    ]);
  });

  it('deep nesting, without running out of stack', () => {
    expect(refusals(`${'('.repeat(240)}true${')'.repeat(240)}`)).toHaveLength(1);
  });
});

describe('parseTemplate on expressions', () => {
  const placeOf = (source: string): [string | undefined, string | undefined] => {
    try {
      parseTemplate(source, 'trial.yaml');
    } catch (error) {
      if (!(error instanceof DomainFailure)) throw error;
      return [error.places[0]?.path, error.places[0]?.message.split('\n')[0]];
    }
    return [undefined, undefined];
  };
  const reading = (limits: string, dimension = 'temperature', ...more: string[]) =>
    templateText({
      steps: stepText(
        'kind: reading',
        'key: a',
        `dimension: ${dimension}`,
        `limits: { ${limits} }`,
        'source: Common practice',
        ...more,
      ),
    });

  it.each<[what: string, source: string, path: string, sentence: RegExp]>([
    [
      'an unknown name in `applies`',
      templateText({ head: 'applies: circuit.hasWalkIn && x' }),
      '5:31',
      /Unknown variable: x/,
    ],
    [
      'an unknown name in quotes',
      templateText({ head: 'applies: "true && x"' }),
      '5:19',
      /Unknown variable: x/,
    ],
    [
      '`matches` in `when`',
      templateText({ steps: stepText('kind: confirm', 'key: a', 'when: circuit.code.matches("a")') }),
      '14:15',
      /`matches`/,
    ],
    [
      'a fixture in a section',
      templateText({ sectionWhen: 'fixture.tag == "a"' }),
      '10:11',
      /Unknown variable: fixture/,
    ],
    [
      'a sum of temperatures as a limit',
      reading('low: temperatureF(1) + temperatureF(2)'),
      '15:24',
      /Two temperatures/,
    ],
    [
      'a limit without unit',
      reading('low: "41"'),
      '15:25',
      /no unit that measures temperature; write for example 41 °F/,
    ],
    ['a limit as a bare number', reading('low: 41'), '15:24', /`low` must be text/],
    ['a limit in another unit', reading('low: 41 psig'), '15:24', /no unit that measures temperature/],
    [
      'a difference as a temperature',
      reading('low: 10 K'),
      '15:24',
      /No instrument shows such a temperature/,
    ],
    [
      'a limit of pressure as an expression',
      reading('low: temperatureF(1)', 'gaugePressure'),
      '15:24',
      /is a number with its unit; write for example 60 psig/,
    ],
    [
      'limits that cross',
      reading('low: 41 °F, high: 3 °C'),
      '15:24',
      /The low limit lies above the high one/,
    ],
    [
      'a value that may be silent',
      reading('high: circuit.defrost.terminationTemperatureK'),
      '15:25',
      /ask `hasTerminationTemperature` first/,
    ],
  ])('refuses %s', (_what, source, path, sentence) => {
    const [where, why] = placeOf(source);
    expect(where).toBe(`trial.yaml:${path}`);
    expect(why).toMatch(sentence);
  });

  it('takes a value that may be silent where `when` asks for it', () => {
    const source = reading(
      'high: circuit.defrost.terminationTemperatureK',
      'temperature',
      'when: circuit.defrost.hasTerminationTemperature',
    );
    expect(placeOf(source)).toEqual([undefined, undefined]);
  });

  it.each<[text: string, sentence: RegExp]>([
    ['{{fixture.tag}}', /not known at this place, which knows opening, system, suctionGroup, circuit/],
    ['{{circuit.colour}}', /There is no such fact: circuit.colour/],
    ['{{opening.elevationM}}', /can't stand in a text/],
    ['{{circuit.fixtures}}', /can't stand in a text/],
    ['{{circuit.code', /with both ends/],
    ['{{circuit.constructor.name}}', /There is no such fact/],
  ])('refuses the placeholder %s', (text, sentence) => {
    const source = templateText({
      steps: stepText('kind: confirm', 'key: a', `instruction: { en: "Go ${text}", es: Vaya }`),
    });
    const [where, why] = placeOf(source);
    expect(where).toBe('trial.yaml:14:32');
    expect(why).toMatch(sentence);
  });
});
