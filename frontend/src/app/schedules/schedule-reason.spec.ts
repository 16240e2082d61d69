import { beforeEach, describe, expect, it } from '@jest/globals';
import { TestBed } from '@angular/core/testing';
import { TranslocoService } from '@jsverse/transloco';
import { LANGUAGES, type Language } from '#shared/checklist/text';
import {
  NEEDED_COLUMN_IDS,
  SCHEDULE_LEVELS,
  SCHEDULE_REASON_CODES,
  SCHEDULE_WORDS,
  scheduleReasonSchema,
  type ScheduleReason,
} from '#shared/contracts/schedule-reasons';
import { WORDS as EN } from '../../i18n/loader/en';
import { WORDS as ES } from '../../i18n/loader/es';
import { withWords } from '../ui/words/with-words.fixture';
import { headingsInWords, reasonInWords, type Say } from './schedule-reason';
import { EACH_REASON } from './schedule-reason.fixture';

const WORDS: Readonly<Record<Language, object>> = { en: EN.schedules, es: ES.schedules };

describe.each(LANGUAGES)('the words of a refused schedule in %s', (language) => {
  let say: Say;
  const said = (reason: ScheduleReason): string => reasonInWords(reason, say, language);

  beforeEach(() => {
    TestBed.configureTestingModule({ imports: [withWords(language)] });
    const words = TestBed.inject(TranslocoService);
    say = (key, parameters) => words.translate(key, parameters, language);
  });

  it('are there for every code, level, column and word', () => {
    const keys = [
      ...SCHEDULE_REASON_CODES.flatMap((code) =>
        code === 'moreProblems' ? [`reason_${code}One`, `reason_${code}Many`] : [`reason_${code}`],
      ),
      ...SCHEDULE_LEVELS.map((level) => `level_${level}`),
      ...NEEDED_COLUMN_IDS.map((column) => `needed_${column}`),
      ...SCHEDULE_WORDS.map((word) => `word_${word}`),
    ];
    expect(keys.filter((key) => !(key in WORDS[language]))).toEqual([]);
  });

  it.each(EACH_REASON)('make a whole sentence of $code', (reason) => {
    expect(scheduleReasonSchema.parse(reason)).toEqual(reason);
    expect(said(reason)).toMatch(/^[\p{Lu}\p{N}“«].+\.$/u);
    expect(said(reason)).not.toMatch(/[{}]|undefined|NaN|\[object|schedules\./);
  });

  it('end over a cell that looks like a parameter', () => {
    const text = 'so long that it grows: {{text}} {{{text}}}';
    const sentence = said({ code: 'notANumber', params: { text } });
    expect(sentence).toContain(text);
    const found = ['{{text}} {{headings}}'];
    const reason = {
      code: 'missingColumn',
      params: { column: 'system', heading: 'System', found, moreCount: 0 },
    };
    const headings = headingsInWords([reason as ScheduleReason], say) ?? '';
    const line = say('schedules.foundHeadings', { headings });
    expect(line).toContain('{{text}} {{headings}}');
  });
});

describe('reasonInWords', () => {
  const sayIn = (language: Language): Say => {
    TestBed.configureTestingModule({ imports: [withWords(language)] });
    const words = TestBed.inject(TranslocoService);
    return (key, parameters) => words.translate(key, parameters, language);
  };
  const reasonOf = (code: ScheduleReason['code']) => EACH_REASON.find((reason) => reason.code === code)!;

  it.each([
    ['unknownUnit', 'La unidad «psq» no se conoce aquí; escriba ft, m o in.'],
    [
      'unknownWord',
      '«cool» no es una palabra conocida aquí; escriba low (baja), medium (media) o high (alta).',
    ],
    ['missingColumn', 'Falta la columna «System» (sistema); agréguela.'],
    ['missingName', 'Falta el grupo de succión y la fila de arriba tampoco lo tiene; llene la celda.'],
    ['outOfRange', '«-77» está fuera del rango posible, de -76 °F a 68 °F; revise el número y su unidad.'],
    ['fileTooLarge', 'El archivo supera los 5 MB; quite lo que no sea parte de la cédula.'],
  ] as const)('says %s in Spanish', (code, sentence) => {
    expect(reasonInWords(reasonOf(code), sayIn('es'), 'es')).toBe(sentence);
  });

  it.each([
    ['unknownUnit', 'The unit “psq” is not known here; write ft, m, or in.'],
    ['missingColumn', 'The column “System” is missing; add it.'],
    ['unknownWord', '“cool” is not a known word here; write low, medium, or high.'],
  ] as const)('says %s in English', (code, sentence) => {
    expect(reasonInWords(reasonOf(code), sayIn('en'), 'en')).toBe(sentence);
  });

  it('counts what follows', () => {
    const say = sayIn('es');
    expect(reasonInWords({ code: 'moreProblems', params: { count: 1 } }, say, 'es')).toMatch(
      /^Queda 1 punto/,
    );
  });

  it('writes bounds with a decimal point in both languages', () => {
    const reason: ScheduleReason = {
      code: 'outOfRange',
      params: { text: '9', low: 0.05, high: 1_710_000, unit: 'BTU_h' },
    };
    expect(reasonInWords(reason, sayIn('es'), 'es')).toContain('de 0.05 BTU/h a 1,710,000 BTU/h');
  });
});

describe('headingsInWords', () => {
  const say: Say = (_key, parameters) => `<${parameters?.['text']}>`;
  const missing = (moreCount: number): ScheduleReason => ({
    code: 'missingColumn',
    params: { column: 'circuit', heading: 'Circuit', found: ['Rack', 'Case'], moreCount },
  });
  const other: ScheduleReason = { code: 'notANumber', params: { text: 'x' } };

  it('names them once, however many columns are missing', () => {
    expect(headingsInWords([other, missing(0), missing(0)], say)).toBe('<Rack>, <Case>');
    expect(headingsInWords([missing(3)], say)).toBe('<Rack>, <Case>, …');
  });

  it('names none where no column is missing', () => {
    expect(headingsInWords([other], say)).toBeNull();
  });
});
