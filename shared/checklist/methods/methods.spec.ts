import fc from 'fast-check';
import { describe, expect, it } from '@jest/globals';
import { fromSi, toSi } from '../../units/convert';
import { UNITS, type Dimension, type UnitId } from '../../units/unit';
import { judgementSchema } from '../judgement';
import { measurementAnswerSchema, type MeasurementAnswer } from '../kinds/measurement';
import { buildStep, SEA_LEVEL } from '../step.fixture';
import type { TypedValue } from '../typed-value';
import { judgeMeasurement } from './judge-measurement';
import { answerOf, doubtsOf, GOOD, GOOD_ANSWERS, judgeAnswer, judgeMeasured } from './measurement.fixture';
import type { Method, MethodField } from './method';
import { METHOD_KEYS, type MethodKey } from './method-keys';
import { METHODS } from './methods';

const UNIT_IDS = Object.keys(UNITS) as UnitId[];
const unitsOf = (dimension: Dimension): UnitId[] =>
  UNIT_IDS.filter((unit) => UNITS[unit].dimension === dimension);

type Boxes = Pick<MeasurementAnswer, 'quantities' | 'words'>;
interface Place {
  readonly method: MethodKey;
  readonly field: MethodField;
  /** Of the row that the box stands in; null for one above the rows. */
  readonly row: number | null;
}

const fieldsOf = (method: Method): MethodField[] => [...method.fields, ...(method.rows?.fields ?? [])];

const PLACES: readonly Place[] = METHOD_KEYS.flatMap((method) => [
  ...METHODS[method].fields.map((field) => ({ method, field, row: null })),
  ...(METHODS[method].rows?.fields ?? []).map((field) => ({ method, field, row: 1 })),
]);
const placesOf = (wanted: (field: MethodField) => boolean): [string, Place][] =>
  PLACES.filter(({ field }) => wanted(field)).map((place) => [`${place.method}.${place.field.key}`, place]);

/** The good answer with one box filled otherwise; `null` empties it. */
function changed({ method, field, row }: Place, value: TypedValue | string | null) {
  const answer = structuredClone(answerOf(GOOD[method]));
  const boxes: Boxes | undefined = row === null ? answer : answer.rows[row];
  if (!boxes) throw new Error(`no row ${row} in the good answer of ${method}`);
  if (value === null) {
    delete boxes.quantities[field.key];
    delete boxes.words[field.key];
  } else if (typeof value === 'string') boxes.words[field.key] = value;
  else boxes.quantities[field.key] = value;
  return judgeAnswer(GOOD[method], answer);
}

const emptied = (place: Place): (TypedValue | string | null)[] =>
  place.field.kind === 'quantity'
    ? [null, { text: '  ', unit: unitsOf(place.field.dimension)[0] ?? 'count' }]
    : [null, '', '   '];

describe.each(METHOD_KEYS)('the method %s', (key) => {
  const method = METHODS[key];
  const { criteria = {} } = GOOD[key];

  it('says everything in both languages', () => {
    const options = fieldsOf(method).flatMap((field) => (field.kind === 'choice' ? field.options : []));
    const texts = [
      method.title,
      ...(method.rows ? [method.rows.label] : []),
      ...[...fieldsOf(method), ...method.criteria, ...options].map(({ label }) => label),
    ];
    expect(texts.filter(({ en, es }) => en.trim() === '' || es.trim() === '')).toEqual([]);
    expect(texts.filter(({ en, es }) => en === es && en.length > 4)).toEqual([]);
  });

  it('names each box and each criterion once', () => {
    for (const list of [method.fields, method.rows?.fields ?? [], method.criteria]) {
      const keys = list.map((one) => one.key);
      expect(new Set(keys).size).toBe(keys.length);
      const labels = list.map(({ label }) => label.en);
      expect(new Set(labels).size).toBe(labels.length);
    }
  });

  it('judges a good answer within, and shows how, in a judgement that can be stored', () => {
    const judgement = judgeMeasured(GOOD[key]);
    expect(judgement).toMatchObject({ outcome: 'within', side: null, counts: true, doubts: [] });
    expect(judgement.working.length).toBeGreaterThan(0);
    expect(judgement.working.every(({ source, lines }) => source !== '' && lines.length > 0)).toBe(true);
    expect(judgementSchema.parse(JSON.parse(JSON.stringify(judgement)))).toEqual(judgement);
    expect(measurementAnswerSchema.parse(answerOf(GOOD[key]))).toEqual(answerOf(GOOD[key]));
  });

  it('gives figures and limits in SI units', () => {
    const { figures, limit, working } = judgeMeasured(GOOD[key]);
    const units = [...figures, ...working.flatMap(({ lines }) => lines), ...(limit ? [limit] : [])];
    expect(units.filter(({ unit }) => UNITS[unit].factor !== 1 || UNITS[unit].offset !== 0)).toEqual([]);
    expect(limit === null || limit.unit === figures[0]?.unit).toBe(true);
  });

  it('repeats in its working what was typed and what is asked, in the same kind of unit', () => {
    const lines = judgeMeasured(GOOD[key]).working.flatMap((working) => working.lines);
    for (const box of [...method.fields, ...method.criteria]) {
      const line = lines.find(({ label }) => label === box.key);
      if (!line || !('dimension' in box)) continue;
      const typed = answerOf(GOOD[key]).quantities[box.key];
      const value = typed ? toSi(Number(typed.text), typed.unit) : criteria[box.key];
      expect([box.key, UNITS[line.unit].dimension]).toEqual([box.key, box.dimension]);
      expect(line.value).toBeCloseTo(value ?? NaN, 6);
    }
  });

  it('has no criterion where a needed one is missing or null', () => {
    for (const { key: needed } of method.criteria.filter(({ required }) => required)) {
      const { [needed]: _left, ...others } = criteria;
      for (const given of [others, { ...criteria, [needed]: null }]) {
        const judgement = judgeMeasured({ ...GOOD[key], criteria: given });
        expect(doubtsOf(judgement)).toEqual(['refuse noCriterion']);
        expect(judgement.outcome).toBe('recorded');
      }
    }
  });

  it('judges without the criteria that it can do without', () => {
    const kept = method.criteria.filter(({ required }) => required).map((one) => one.key);
    // One of the two has to be there: the method's own rule.
    if (key === 'evacuation') kept.push('limit');
    if (key === 'regulatorPressure') kept.push('dew');
    const only = Object.fromEntries(kept.map((one) => [one, criteria[one] ?? null]));
    expect(judgeMeasured({ ...GOOD[key], criteria: only }).counts).toBe(true);
  });

  it('takes no row too many', () => {
    const answer = answerOf(GOOD[key]);
    const row = answer.rows.at(-1) ?? { quantities: {}, words: {} };
    const most = method.rows?.most ?? 0;
    const full = { ...answer, rows: Array.from({ length: most + 1 }, () => row) };
    expect(doubtsOf(judgeAnswer(GOOD[key], full))).toEqual(['refuse tooMany']);
    expect(measurementAnswerSchema.safeParse(full).success).toBe(true);
    const asked = judgeAnswer(GOOD[key], { ...full, rows: full.rows.slice(0, most) });
    expect(doubtsOf(asked)).not.toContain('refuse tooMany');
  });

  it('lets no box named like a part of every object in', () => {
    const names = ['constructor', '__proto__', 'toString', 'hasOwnProperty', 'valueOf'];
    const strange = JSON.parse(
      JSON.stringify(answerOf(GOOD[key]))
        .replaceAll(
          '"quantities":{',
          `"quantities":{${names.map((name) => `"${name}":{"text":"1","unit":"K"},`).join('')}`,
        )
        .replaceAll(',}', '}'),
    ) as MeasurementAnswer;
    expect(judgeAnswer(GOOD[key], strange)).toEqual(judgeMeasured(GOOD[key]));
    const parsed = measurementAnswerSchema.parse(strange);
    expect(judgeAnswer(GOOD[key], parsed)).toEqual(judgeMeasured(GOOD[key]));
    expect(Object.getPrototypeOf({})).toBe(Object.prototype);
    expect(({} as { text?: string }).text).toBeUndefined();
  });

  it('does not change the answer', () => {
    const answer = answerOf(GOOD[key]);
    const before = structuredClone(answer);
    judgeAnswer(GOOD[key], answer);
    expect(answer).toEqual(before);
  });

  it('refuses an answer of another method', () => {
    const other = METHOD_KEYS.find((candidate) => candidate !== key) ?? key;
    expect(doubtsOf(judgeAnswer(GOOD[key], answerOf(GOOD[other])))).toEqual(['refuse wrongAnswerKind']);
  });
});

describe('a box of a measurement', () => {
  it.each(placesOf((field) => field.required))('has to be filled: %s', (_, place) => {
    const severity = METHODS[place.method].inTwoVisits ? 'keep' : 'refuse';
    for (const empty of emptied(place)) {
      const judgement = changed(place, empty);
      expect(doubtsOf(judgement)).toEqual([`${severity} incomplete`]);
      expect(judgement).toMatchObject({ outcome: 'recorded', counts: false, figures: [] });
    }
  });

  it.each(placesOf((field) => !field.required))('may stay empty: %s', (_, place) => {
    for (const empty of emptied(place)) {
      // Whether the others are enough is the method's own question; nothing is unreadable.
      expect(['', 'refuse incomplete']).toContain(doubtsOf(changed(place, empty)).join());
    }
  });

  it.each(placesOf(({ kind }) => kind === 'quantity'))('has to be readable: %s', (_, place) => {
    if (place.field.kind !== 'quantity') throw new Error('no quantity');
    const [unit = 'count'] = unitsOf(place.field.dimension);
    for (const [text, doubt] of [
      ['warm', 'notANumber'],
      ['1e3', 'notANumber'],
      ['1,234', 'ambiguous'],
      ['9'.repeat(400), 'notFinite'],
    ] as const) {
      expect(doubtsOf(changed(place, { text, unit }))).toEqual([`refuse ${doubt}`]);
    }
    const wrong: UnitId = place.field.dimension === 'area' ? 'ft' : 'ft2';
    expect(doubtsOf(changed(place, { text: '1', unit: wrong }))).toEqual(['refuse wrongUnit']);
  });

  it.each(placesOf(({ kind }) => kind === 'choice'))('takes only what it offers: %s', (_, place) => {
    for (const word of ['other', 'constructor', '__proto__']) {
      expect(doubtsOf(changed(place, word))).toEqual(['refuse unknownOption']);
    }
  });

  it('is read as a temperature, never as a difference of two', () => {
    const place = PLACES.find(({ field }) => field.key === 'lineTemperature');
    expect(place && doubtsOf(changed(place, { text: '86', unit: 'degF_diff' }))).toEqual([
      'refuse wrongUnit',
    ]);
  });

  it('that is empty and one that can’t be read are both told of, and then nothing is kept as a half', () => {
    const { typed } = GOOD.pressureTest;
    const { held: _held, ...others } = typed;
    const judgement = judgeMeasured({ ...GOOD.pressureTest, typed: { ...others, endPressure: 'warm psig' } });
    expect(doubtsOf(judgement).sort()).toEqual(['refuse incomplete', 'refuse notANumber']);
  });
});

describe('judgeMeasurement', () => {
  it('has every method, each with its own file', () => {
    expect(Object.keys(METHODS)).toEqual([...METHOD_KEYS]);
    expect(new Set(Object.values(METHODS)).size).toBe(METHOD_KEYS.length);
  });

  it('says where the criterion comes from', () => {
    const step = buildStep('measurement', { method: 'subcooling', criteria: { low: 1 }, source: null });
    const answer = answerOf(GOOD.subcooling);
    expect(judgeMeasurement(step, answer, SEA_LEVEL).limit?.source).toBe('');
    expect(judgeMeasurement({ ...step, source: 'a manual' }, answer, SEA_LEVEL).limit?.source).toBe(
      'a manual',
    );
  });

  /** The same value in another unit of the same dimension, as text. */
  const inUnit = ({ unit }: TypedValue, si: number): TypedValue => ({
    text: fromSi(si, unit).toFixed(10),
    unit,
  });

  const pick = fc.integer({ min: 0, max: 1000 });

  it('does not depend on the units that were typed', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...GOOD_ANSWERS),
        fc.infiniteStream(fc.double({ min: 0.9, max: 1.1, noNaN: true })),
        fc.infiniteStream(pick),
        (measured, factors, picks) => {
          const one = answerOf(measured);
          const next = <T>(stream: Iterator<T>): T => stream.next().value as T;
          const both = (boxes: Boxes): [Boxes, Boxes] => {
            const [a, b]: [Boxes, Boxes] = [
              { quantities: {}, words: boxes.words },
              { quantities: {}, words: boxes.words },
            ];
            for (const [field, typed] of Object.entries(boxes.quantities)) {
              const si = toSi(Number(typed.text), typed.unit) * next(factors);
              const units = unitsOf(UNITS[typed.unit].dimension);
              const other = units[next(picks) % units.length] ?? typed.unit;
              a.quantities[field] = inUnit(typed, si);
              b.quantities[field] = inUnit({ ...typed, unit: other }, si);
            }
            return [a, b];
          };
          const rows = one.rows.map(both);
          const [a, b] = both(one);
          const left = judgeAnswer(measured, { ...one, ...a, rows: rows.map(([row]) => row) });
          const right = judgeAnswer(measured, { ...one, ...b, rows: rows.map(([, row]) => row) });
          expect([right.outcome, right.side, right.verdicts, doubtsOf(right)]).toEqual([
            left.outcome,
            left.side,
            left.verdicts,
            doubtsOf(left),
          ]);
          left.figures.forEach(({ value }, index) => {
            const off = Math.abs((right.figures[index]?.value ?? NaN) - value);
            expect(off).toBeLessThanOrEqual(1e-4 * Math.max(1, Math.abs(value)));
          });
        },
      ),
      { numRuns: 600 },
    );
  });

  it('never throws and never gives a figure that is no number, whatever is typed', () => {
    const text = fc.oneof(fc.string({ maxLength: 12 }), fc.double({ min: -1e6, max: 1e6 }).map(String));
    const unit = fc.constantFrom(...UNIT_IDS);
    fc.assert(
      fc.property(
        fc.constantFrom(...PLACES),
        fc.oneof(fc.record({ text, unit }), text),
        text,
        (place, value, number) => {
          const good =
            typeof value === 'object' && place.field.kind === 'quantity'
              ? [value, { text: number, unit: unitsOf(place.field.dimension)[0] ?? 'count' }]
              : [value];
          for (const typed of good) {
            const judgement = changed(place, typed);
            expect(judgementSchema.safeParse(JSON.parse(JSON.stringify(judgement))).success).toBe(true);
            if (judgement.outcome !== 'recorded') expect(judgement.working.length).toBeGreaterThan(0);
          }
        },
      ),
      { numRuns: 1500 },
    );
  });
});
