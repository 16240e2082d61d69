import { describe, expect, it } from '@jest/globals';
import { DomainFailure } from '#shared/failures/failure';
import { parseTemplate } from './parse-template';
import { CONFIRM, stepText, templateText } from './written-template.fixture';

const FILE = 'trial.yaml';

function refusal(source: string): DomainFailure {
  try {
    parseTemplate(source, FILE);
  } catch (error) {
    if (error instanceof DomainFailure && error.code === 'templateRefused') return error;
    throw error;
  }
  throw new Error('It was accepted.');
}

/** Where and why the first problem is, without the line and the caret. */
function firstOf(source: string): [path: string | undefined, sentence: string | undefined] {
  const [place] = refusal(source).places;
  return [place?.path, place?.message.split('\n')[0]];
}

describe('parseTemplate', () => {
  it('reads a template with its defaults', () => {
    const template = parseTemplate(templateText(), FILE);
    expect(template).toMatchObject({ key: 'trial', version: 3, level: 'circuit', priority: 5 });
    expect(template.sections[0]?.steps[0]).toMatchObject({
      key: 'look',
      scope: 'circuit',
      when: null,
      required: true,
      source: null,
      body: { kind: 'confirm' },
    });
  });

  it('shows the line with a caret under the place', () => {
    const place = refusal(
      templateText({ head: 'applies: "true" ', steps: CONFIRM.replace('confirm', 'confrim') }),
    ).places[0];
    expect(place?.path).toBe('trial.yaml:12:15');
    expect(place?.message).toBe(
      [
        '`kind` must be one of confirm, choose, reading, superheat, photo, note, override, signature.',
        '        kind: confrim',
        '              ^',
      ].join('\n'),
    );
  });

  it('names every problem at once, in reading order', () => {
    const failure = refusal(
      templateText({
        head: 'applies: circuit.colour == "red"',
        steps: [
          stepText('kind: photo', 'key: a', 'min_count: 1', 'when: fixture.tag == "x"'),
          stepText('kind: confirm', 'key: a'),
        ].join('\n'),
      }),
    );
    expect(failure.places.map((place) => place.path)).toEqual([
      'trial.yaml:5:18',
      'trial.yaml:15:15',
      'trial.yaml:18:14',
    ]);
    expect(failure.message).toContain('trial.yaml has 3 problems; the first is at trial.yaml:5:18');
  });

  it('reads lines that end the Windows way and points into them', () => {
    const source = templateText({ steps: CONFIRM.replace('confirm', 'confrim') }).replaceAll('\n', '\r\n');
    const place = refusal(source).places[0];
    expect(place?.path).toBe('trial.yaml:12:15');
    expect(place?.message.split('\n')[1]).toBe('        kind: confrim');
  });
});

describe('parseTemplate refuses what is no sound YAML:', () => {
  it.each<[what: string, source: string, path: string, sentence: RegExp]>([
    ['a duplicate key', `key: a\n${templateText()}`, 'trial.yaml:2:1', /unique/],
    [
      'a tab as indentation',
      templateText().replace('        kind', '\tkind'),
      'trial.yaml:12:1',
      /Tabs are not allowed/,
    ],
    ['an alias', 'key: &a [x]\nversion: *a\n', 'trial.yaml:1:9', /Anchors are not allowed/],
    ['a tag', 'key: !!js/function x\n', 'trial.yaml:1:6', /Unresolved tag/],
    ['a second document', `${templateText()}---\nkey: b\n`, 'trial.yaml:14:1', /one template only/],
    ['an empty file', '', 'trial.yaml:1:1', /empty|hold keys/],
    ['a bare word', 'hello', 'trial.yaml:1:1', /The template must hold keys with values/],
    ['an unclosed list', 'key: [a\n', 'trial.yaml:2:1', /end with a \]/],
  ])('%s', (_what, source, path, sentence) => {
    const [found, why] = firstOf(source);
    expect(found).toBe(path);
    expect(why).toMatch(sentence);
  });

  it('a bomb of aliases, without unfolding it', () => {
    const levels = Array.from({ length: 12 }, (_unused, level) => {
      const items = Array.from({ length: 9 }, () => (level === 0 ? 'x' : `*l${level - 1}`)).join(', ');
      return `l${level}: &l${level} [${items}]`;
    });
    expect(refusal(levels.join('\n')).places[0]?.message).toMatch(/Anchors are not allowed/);
  });

  it.each([
    ['brackets', '['.repeat(90_000)],
    ['list items', '- '.repeat(90_000)],
    ['keys', 'a: '.repeat(60_000)],
  ])('endless nesting of %s', (_what, source) => {
    expect(firstOf(source)[1]).toMatch(/nested too deeply/);
  });

  it('more than 200 kB', () => {
    expect(firstOf(`# ${'x'.repeat(200_000)}`)[1]).toMatch(/at most 200 kB/);
  });
});

describe('parseTemplate refuses a wrong shape:', () => {
  it.each<[what: string, source: string, path: string, sentence: string]>([
    [
      'an unknown key',
      templateText({ steps: `${CONFIRM}\n        colour: red` }),
      '14:9',
      '`colour` is not a key that belongs here.',
    ],
    [
      'a key of another kind',
      templateText({ steps: stepText('kind: note', 'key: a', 'min_count: 2') }),
      '14:9',
      '`min_count` is not a key that belongs here.',
    ],
    ['a missing key', templateText({ steps: stepText('kind: confirm') }), '11:9', '`key` is missing here.'],
    [
      'a missing translation',
      templateText().replace(', es: Mire', ''),
      '11:9',
      '`es` is missing here: every text stands in English and in Spanish.',
    ],
    [
      'an empty translation',
      templateText().replace('es: Mire', 'es: ""'),
      '11:32',
      '`es` must not be empty.',
    ],
    [
      'a photo without count',
      templateText({ steps: stepText('kind: photo', 'key: a') }),
      '11:9',
      '`min_count` is missing here: a photo step says how many photos it needs.',
    ],
    [
      'an unknown level',
      templateText().replace('level: circuit', 'level: store'),
      '3:8',
      '`level` must be one of system, suctionGroup, circuit.',
    ],
    [
      'a version that is no number',
      templateText().replace('version: 3', 'version: new'),
      '2:10',
      '`version` must be a number.',
    ],
    [
      'a key with a colon',
      templateText().replace('key: look', 'key: "a:b"'),
      '13:14',
      '`key` must begin with a small letter and hold only small letters, digits and hyphens, at most 60.',
    ],
    [
      'an unknown hazard',
      templateText({
        steps: stepText('kind: confirm', 'key: a', 'caution: { hazard: bears, text: { en: B, es: O } }'),
      }),
      '14:28',
      '`hazard` must be one of pressure, electricity, asphyxiation, co2, flammable, cold, rotating, height.',
    ],
    [
      'an unknown dimension',
      templateText({ steps: stepText('kind: reading', 'key: a', 'dimension: colour') }),
      '14:20',
      '`dimension` must be one of temperature, temperatureDifference, gaugePressure, absolutePressure, vacuum, pressureDifference, length, area, heatFlow, mass, duration, electricCurrent, voltage, power, ratio, count.',
    ],
    [
      'a choice of one',
      templateText({
        steps: stepText(
          'kind: choose',
          'key: a',
          'options: [{ value: a, label: { en: A, es: A }, outcome: within }]',
        ),
      }),
      '14:18',
      '`options` must have at least 2 items.',
    ],
  ])('%s', (_what, source, path, sentence) => {
    expect(firstOf(source)).toEqual([`trial.yaml:${path}`, sentence]);
  });
});

describe('parseTemplate refuses what makes no sense:', () => {
  const source = 'source: Common practice';
  it.each<[what: string, steps: string, path: string, sentence: string]>([
    ['a step key that stands twice', `${CONFIRM}\n${CONFIRM}`, '16:14', 'Step `look` stands here twice.'],
    [
      'an option that stands twice',
      stepText(
        'kind: choose',
        'key: a',
        source,
        'options:',
        '  - { value: a, label: { en: A, es: A }, outcome: within }',
        '  - { value: a, label: { en: B, es: B }, outcome: outside }',
      ),
      '17:22',
      '`a` stands here twice.',
    ],
    [
      'a criterion without a source',
      stepText('kind: reading', 'key: a', 'dimension: temperature', 'limits: { high: 41 °F }'),
      '11:9',
      'A criterion names its source: a publication\'s title, "From the schedule" or "Common practice".',
    ],
    [
      'empty limits',
      stepText('kind: reading', 'key: a', 'dimension: temperature', 'limits: {}'),
      '15:17',
      '`limits` holds low, high or both; without it the value is recorded.',
    ],
    [
      'superheat of a whole fixture',
      stepText('kind: superheat', 'key: a', 'for_each: fixture', source),
      '12:15',
      'Superheat is set per coil: write for_each: coil.',
    ],
  ])('%s', (_what, steps, path, sentence) => {
    expect(firstOf(templateText({ steps }))).toEqual([`trial.yaml:${path}`, sentence]);
  });

  it('a section key that stands twice', () => {
    const again = [
      '  - key: first',
      '    title: { en: Again, es: Otra }',
      '    steps:',
      CONFIRM.replace('look', 'other'),
    ];
    expect(firstOf(templateText() + again.join('\n'))).toEqual([
      'trial.yaml:14:10',
      'Section `first` stands here twice.',
    ]);
  });
});
