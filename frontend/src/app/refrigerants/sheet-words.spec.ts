import { beforeEach, describe, expect, it } from '@jest/globals';
import { TestBed } from '@angular/core/testing';
import { TranslocoService } from '@jsverse/transloco';
import { LANGUAGES, type Language } from '#shared/checklist/text';
import { problem, type MakersTableProblem } from '#shared/refrigeration/makers-table/makers-table';
import type { ReadingProblem } from '#shared/refrigeration/makers-table/read-makers-table';
import { withWords } from '../ui/words/with-words.fixture';
import { NAME_CODES, readSheet } from './sheet-reading';
import { problemInWords, readingInWords, type Say } from './sheet-words';
import { sheetText } from './sheet.fixture';

type Code = MakersTableProblem['code'];
const K = (label: string, value: number) => ({ label, value, unit: 'K' }) as const;
const PA = (label: string, value: number) => ({ label, value, unit: 'Pa' }) as const;

/** One of each code with the figures that the checks give it; a new code without words fails to compile here. */
const EACH: Readonly<Record<Code, Partial<MakersTableProblem>>> = {
  noDesignation: {},
  noIssuer: {},
  noEdition: {},
  tooFewPoints: { values: [{ label: 'points', value: 4, unit: 'count' }] },
  notFinite: { row: 2 },
  belowAbsoluteZero: { row: 2, values: [K('temperature', -3)] },
  notPositive: { row: 2, column: 'dew', values: [PA('dew', -5000)] },
  notAscending: { row: 2, values: [K('temperatureBefore', 260), K('temperature', 250)] },
  descending: {},
  repeatedTemperature: { row: 2, values: [K('temperatureBefore', 260), K('temperature', 260)] },
  gapTooWide: {
    row: 2,
    values: [
      K('temperatureBefore', 233.15),
      K('temperature', 273.15),
      { label: 'step', value: 40, unit: 'K_diff' },
    ],
  },
  notRising: { row: 2, column: 'bubble', values: [PA('pressureBefore', 3e5), PA('pressure', 2e5)] },
  dewAboveBubble: { row: 2, column: 'dew', values: [PA('bubble', 2e5), PA('dew', 3e5)] },
  columnsSwapped: {},
  outlyingPoint: { row: 2, column: 'dew', values: [PA('dew', 3e5), PA('dewExpected', 2e5)] },
  notSmooth: { column: 'both' },
  gaugeTakenForAbsolute: {},
  absoluteTakenForGauge: {},
  celsiusInFahrenheit: {},
  fahrenheitInCelsius: {},
  unlikeAnyRefrigerant: { values: [{ label: 'pressureRatio', value: 3.21, unit: 'fraction' }] },
  farFromRelatives: { values: [{ label: 'pressureRatio', value: 3.21, unit: 'fraction' }] },
  differsFromOwn: {
    row: 2,
    column: 'dew',
    values: [{ label: 'differenceFromOwn', value: 6, unit: 'K_diff' }],
  },
};
const READING: Readonly<Record<ReadingProblem['code'], Partial<ReadingProblem>>> = {
  empty: {},
  emptyCell: { row: 3, column: 2 },
  notANumber: { row: 3, column: 2, text: 'x' },
  ambiguousNumber: { row: 3, column: 2, text: '1,234' },
  columnsUnknown: { row: 1 },
  headingUnitsDiffer: { row: 1 },
  tooManyColumns: { row: 1 },
  tooFewColumns: { row: 1 },
};

const WHOLE = /^[\p{Lu}\p{N}\u2212«“¿].+[.?]$/u;
const UNFINISHED = /[{}]|undefined|NaN|—|refrigerants\./;

describe.each(LANGUAGES)('the words about a sheet in %s', (language: Language) => {
  let say: Say;
  const scene = {
    units: { temperature: 'degF', pressure: 'psig' },
    lines: [4, 5, 6],
    isPure: false,
    language,
  } as const;

  beforeEach(() => {
    TestBed.configureTestingModule({ imports: [withWords(language)] });
    const words = TestBed.inject(TranslocoService);
    say = (key, parameters) => words.translate(key, parameters, language);
  });

  it.each((Object.keys(EACH) as Code[]).filter((code) => !NAME_CODES.has(code)))(
    'make a whole sentence of %s',
    (code) => {
      const said = problemInWords(problem(code, 'refuse', EACH[code]), scene, say);
      expect(said.sentence).toMatch(WHOLE);
      expect(said.sentence).not.toMatch(UNFINISHED);
      // Line 5 of the text holds the second row.
      expect(said.line).toBe(EACH[code].row === 2 ? 5 : null);
    },
  );

  it.each(Object.keys(READING) as ReadingProblem['code'][])('make a whole sentence of %s', (code) => {
    const said = readingInWords({ code, row: null, column: null, text: '', ...READING[code] }, say);
    expect(said.sentence).toMatch(WHOLE);
    expect(said.sentence).not.toMatch(UNFINISHED);
  });

  it('end over a cell that looks like a parameter', () => {
    const text = '{{text}} {{column}}';
    const { sentence } = readingInWords({ code: 'notANumber', row: 1, column: 1, text }, say);
    expect(sentence).toContain(text);
  });

  it('have other words for a row of which both pressures are off', () => {
    const both = { row: 2, column: 'both', values: [] } as const;
    const { sentence } = problemInWords(problem('outlyingPoint', 'refuse', both), scene, say);
    expect(sentence).toMatch(WHOLE);
    expect(sentence).not.toMatch(UNFINISHED);
  });
});

describe('a slip on a sheet', () => {
  const names = { designation: 'R-9X1', issuer: 'Example Gases', edition: '1' };

  function first(text: string, pressure: 'psig' | 'psia' = 'psig'): string {
    TestBed.configureTestingModule({ imports: [withWords('en')] });
    const words = TestBed.inject(TranslocoService);
    const reading = readSheet(text, { temperature: 'degF', pressure }, names);
    if (reading.kind !== 'figures' || !reading.problems[0]) throw new Error(reading.kind);
    const scene = { ...reading, isPure: false, language: 'en' } as const;
    return problemInWords(reading.problems[0], scene, (key, parameters) =>
      words.translate(key, parameters, 'en'),
    ).sentence;
  }

  it('is told in the units of the sheet', () => {
    const dew = sheetText().split('\n')[3]?.split('\t')[2] ?? '';
    const wrong = sheetText().replace(`\t${dew}`, '\t44.4');
    expect(first(wrong)).toMatch(
      new RegExp(
        `^The dew pressure 44\\.4 psig does not fit its neighbours, which put it near ${dew.slice(0, 2)}`,
      ),
    );
  });

  it('names gaps in differences of the sheet’s unit', () => {
    const lines = sheetText().split('\n');
    const gap = [...lines.slice(0, 3), ...lines.slice(5)].join('\n');
    expect(first(gap)).toContain('there are 54.0 °F; add rows so that at most 18.0 °F lie between two.');
  });
});
