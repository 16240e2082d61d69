import fc from 'fast-check';
import { describe, expect, it } from '@jest/globals';
import { answerOf, doubtsOf, GOOD, judgeMeasured, type Measured } from '../methods/measurement.fixture';
import type { MethodKey } from '../methods/method-keys';
import type { Judgement } from '../judgement';
import { DOUBT_KINDS } from '../judgement';
import { judge } from '../judge';
import { SUPERHEAT_CONDITIONS, type SuperheatAnswer } from '../kinds/superheat';
import { buildStep, hunting, pair, SEA_LEVEL, steady } from '../step.fixture';
import { UNITS } from '../../units/unit';
import type { Text } from '../text';
import { DOUBT_WORDS } from './doubt-words';
import { FIGURE_WORDS, figureWords } from './figure-words';
import { FORMULA_WORDS } from './formula-words';
import { VERDICT_WORDS } from './verdict-words';

// Answers broad enough to bring out whatever the judging code can say: boxes take one of a few telling values each. The
// seed is fixed, so that a red run is red again.
const SAMPLE = { numRuns: 400, seed: 20_261_201 };

type Choices = Readonly<Record<string, readonly (string | null)[]>>;

/** What each box may hold besides what the good answer has; `null`: empty. */
const BOXES: { readonly [K in MethodKey]: Choices } = {
  pressureTest: {
    startPressure: ['150 psig', '300 psig', 'high psig', null],
    endPressure: ['100 psig', '146.9 psig', '294.2 psig', '400 psig', '-20 psig', null],
    held: ['1 h', '24 h'],
    gaugeAccuracy: ['-1 psi_diff', '0.5 psi_diff', '1 psig', null],
  },
  evacuation: { ambientTemperature: ['70 degF', '40 degF', null] },
  supplyVoltage: {
    line12: ['0 V', '400 V', '460 V', '520 V'],
    line23: ['460 V', '440 V', null],
    line31: ['460 V', '455 V'],
  },
  heaterCurrent: {
    supply: ['=onePhase', '=threePhase', '=fourPhase'],
    platePower: ['6 kW_el', null],
    plateCurrent: ['16.6 A', null],
    plateVoltage: ['208 V', null],
    leg1: ['0 A', '9.6 A', '12 A', '14.4 A', '16.6 A', '20 A'],
    leg2: ['0 A', '9.6 A', '14.4 A', '16.6 A', null],
    leg3: ['0 A', '9.6 A', '14.4 A', '16.6 A'],
  },
  returnGas: {
    suctionPressure: ['200 psig', '1100 psig', '-14 psig'],
    returnGasTemperature: ['-30 degF', '-10 degF', '2 degF', '40 degF', '70 degF'],
    dischargeTemperature: ['180 degF', '260 degF', null],
  },
  subcooling: { lineTemperature: ['70 degF', '86 degF', '98 degF', '-500 degF'] },
  regulatorPressure: { pressure: ['80 psig', '60 psig', '700 psig'] },
  witnessedDefrost: {
    took: ['0 min', '28 min', '36 min', '40 min', '-1 min'],
    endTemperature: ['40 degF', '51 degF', null],
  },
  refrigerantCharge: {},
  electronicValve: {
    driverRefrigerant: ['=R-448A', '=R-404A', '=?'],
    transducer: ['45.5 psig', '60 psig', '1,234 psig'],
    iceBath: ['32 degF', '36 degF'],
    opening: ['10 percent', '55 percent'],
  },
};

const micronRows = (points: string) =>
  points.split(' ').map((point) => {
    const [minute, value] = point.split(':');
    return { since: `${minute} min`, pressure: `${value} micron` };
  });

const cylinder = (change: Readonly<Record<string, string>> = {}) => ({
  cylinder: '=A',
  refrigerant: '=R-448A',
  direction: '=in',
  before: '120 lb',
  after: '15 lb',
  ...change,
});

/** Rows that go with the boxes, for the two methods that have any. */
const ROWS: Partial<Record<MethodKey, readonly NonNullable<Measured['rows']>[]>> = {
  evacuation: [
    '0:300',
    '0:300 60:480',
    '0:300 60:50',
    '0:300 60:620',
    '0:300 30:310',
    '0:400 60:480',
    '0:300 20:407 40:513 60:620',
    '0:300 20:4400 40:4570 60:4580',
    '0:300 20:18000 40:18700 60:18750',
  ].map(micronRows),
  refrigerantCharge: [
    [],
    [cylinder()],
    [cylinder({ before: '15 lb', after: '120 lb' })],
    [cylinder({ refrigerant: '=R-744' })],
    [cylinder(), cylinder({ before: '80 lb' })],
    [cylinder(), cylinder({ direction: '=out', before: '15 lb', after: '20 lb' })],
    Array.from({ length: 101 }, () => cylinder()),
  ],
};

function measuredBy(method: MethodKey): Measured[] {
  const good: Measured = GOOD[method];
  const boxes = fc.record(
    Object.fromEntries(
      Object.entries(BOXES[method]).map(([key, values]) => [key, fc.constantFrom(...values)]),
    ),
  );
  const rows = fc.constantFrom(...(ROWS[method] ?? [good.rows ?? []]));
  const names = Object.keys(good.criteria ?? {});
  const left = fc.oneof(
    fc.constant<string[]>([]),
    fc.subarray(names, { maxLength: Math.min(2, names.length) }),
  );
  const arbitrary = fc.tuple(boxes, rows, left).map(([changed, given, without]): Measured => {
    const all = Object.entries({ ...good.typed, ...changed });
    const typed = all.filter((entry): entry is [string, string] => entry[1] !== null);
    const criteria = Object.entries(good.criteria ?? {}).filter(([name]) => !without.includes(name));
    return { ...good, typed: Object.fromEntries(typed), rows: given, criteria: Object.fromEntries(criteria) };
  });
  const others = method === 'regulatorPressure' ? [{ ...good, criteria: { mean: 280, room: 1 } }] : [];
  return [good, ...others, ...fc.sample(arbitrary, SAMPLE)];
}

const readingsOf = (points: string) =>
  points.split(' ').map((point) => {
    const [atS, degF = ''] = point.split(':');
    return { atS: Number(atS), ...pair('16', degF) };
  });

const SWING = Array.from({ length: 21 }, (_, index) => `${index * 60}:${index % 2 === 0 ? -18 : -6}`).join(
  ' ',
);

function superheats(): Judgement[] {
  const looks: SuperheatAnswer['asLeft'][] = [
    ...['-14', '-20.5', '-60', '80', 'cold', '-500'].map((line) => steady(pair('16', line)).asLeft),
    ...['-14', '900', '-20', ''].map((gauge) => steady(pair(gauge, '16')).asLeft),
    steady(pair('16', '-25.5', { temperature: 'degC' })).asLeft,
    steady(pair('45', '-2.2')).asLeft,
    steady(pair('16', '7', { temperature: 'degC' })).asLeft,
    hunting(pair('16', '-31'), pair('16', '-4')).asLeft,
    hunting(pair('16', '-4'), pair('16', '-31')).asLeft,
    ...[SWING, '0:-14', '0:-14 60:-14', '0:-18 200:-16 400:-14 600:-12'].map((points) => ({
      valve: 'series' as const,
      readings: readingsOf(points),
    })),
  ];
  const typed = (text: string) => ({ text, unit: 'psi_diff' as const });
  const answers = fc.record<SuperheatAnswer>({
    kind: fc.constant('superheat'),
    asLeft: fc.constantFrom(...looks),
    asFound: fc.constantFrom(null, ...looks),
    takenAt: fc.constantFrom('coilOutlet', 'coilOutlet', 'elsewhere'),
    lineDrop: fc.constantFrom(null, typed('2'), typed('-2')),
    conditions: fc.constantFrom([...SUPERHEAT_CONDITIONS], []),
    turns: fc.constantFrom([], [{ turns: 0.5, direction: 'clockwise', at: '2027-01-15T12:00:00Z' } as const]),
    waitedS: fc.constantFrom(60, 1800),
    instruments: fc.record({
      gauge: fc.constantFrom('vented', 'sealed', 'absolute'),
      pressureAccuracy: fc.constantFrom(null, typed('1'), typed('x')),
      temperatureAccuracy: fc.constant({ text: '1', unit: 'degF_diff' }),
      barometer: fc.constantFrom(
        null,
        { text: '26.6', unit: 'inHg' as const },
        { text: '29.92', unit: 'inHg' as const },
      ),
    }),
  });
  const facts = { ...SEA_LEVEL, refrigerant: 'R-404A', atmospherePaAbs: 90_000 };
  const step = buildStep('superheat', { band: { lowK: 2.5, highK: 6.5 } });
  const unknown = judge(step, steady(pair('16', '-14')), { ...facts, refrigerant: '' });
  return [
    unknown,
    ...fc.sample(answers, { ...SAMPLE, numRuns: 3000 }).map((answer) => judge(step, answer, facts)),
  ];
}

function trends(): Judgement[] {
  const logs = [97, 20, 1].flatMap((count) => [
    Array.from({ length: count }, () => 275),
    Array.from({ length: count }, () => 285),
    [...Array.from({ length: count }, () => 275), ...Array.from({ length: 9 }, () => 285)],
  ]);
  const step = buildStep('trend', { bandLowK: 270 });
  return [...logs, [275, NaN]].map((temperatureK) =>
    judge(
      step,
      {
        kind: 'trend',
        file: { name: 'air.csv', sha256: 'b'.repeat(64), rows: temperatureK.length },
        startText: '',
        column: '',
        atS: temperatureK.map((_, index) => index * 900),
        temperatureK,
      },
      SEA_LEVEL,
    ),
  );
}

const MEASURED = (Object.keys(GOOD) as MethodKey[]).flatMap(measuredBy);
const OTHERS: Judgement[] = [
  judge(buildStep('reading'), { kind: 'reading', value: { text: '36', unit: 'degF' } }, SEA_LEVEL),
];
const ALL: Judgement[] = [...MEASURED.map(judgeMeasured), ...superheats(), ...trends(), ...OTHERS];

const seen = (codes: (judgement: Judgement) => readonly string[]): Set<string> => new Set(ALL.flatMap(codes));
const VERDICTS = seen(({ verdicts }) => verdicts ?? []);
const FORMULAS = seen(({ working }) => working.map(({ formula }) => formula));
const LABELS = seen(({ figures, working }) =>
  [...figures, ...working.flatMap(({ lines }) => lines)].map(({ label }) => label),
);
const DOUBTS = seen(({ doubts }) => doubts.map(({ kind }) => kind));

const TABLES: [string, Readonly<Record<string, Text>>][] = [
  ['doubts', DOUBT_WORDS],
  ['figures', FIGURE_WORDS],
  ['formulas', FORMULA_WORDS],
  ['verdicts', VERDICT_WORDS],
];

describe('the answers of this spec', () => {
  it('are broad enough to mean something', () => {
    expect(ALL.filter(({ outcome }) => outcome === 'within').length).toBeGreaterThan(100);
    expect(ALL.filter(({ outcome }) => outcome === 'outside').length).toBeGreaterThan(100);
    expect(MEASURED.every((measured) => answerOf(measured).method === measured.method)).toBe(true);
    expect(ALL.some((judgement) => doubtsOf(judgement).includes('keep incomplete'))).toBe(true);
  });
});

describe('words of judgements', () => {
  it('are there for every figure and every line of a working', () => {
    expect([...LABELS].filter((label) => figureWords(label) === null)).toEqual([]);
  });

  it('are there for every formula, verdict and doubt', () => {
    expect([...FORMULAS].filter((formula) => !Object.hasOwn(FORMULA_WORDS, formula))).toEqual([]);
    expect([...VERDICTS].filter((verdict) => !Object.hasOwn(VERDICT_WORDS, verdict))).toEqual([]);
    expect([...DOUBTS].filter((doubt) => !Object.hasOwn(DOUBT_WORDS, doubt))).toEqual([]);
    expect(Object.keys(DOUBT_WORDS).sort()).toEqual([...DOUBT_KINDS].sort());
  });

  it('hold nothing that no judgement says', () => {
    const used = new Set(
      [...LABELS].map((label) => (Object.hasOwn(FIGURE_WORDS, label) ? label : label.replace(/\d+/, '#'))),
    );
    expect(Object.keys(FIGURE_WORDS).filter((label) => !used.has(label))).toEqual([]);
    expect(Object.keys(FORMULA_WORDS).filter((formula) => !FORMULAS.has(formula))).toEqual([]);
    expect(Object.keys(VERDICT_WORDS).filter((verdict) => !VERDICTS.has(verdict))).toEqual([]);
  });

  it.each(TABLES)('say everything in both languages: %s', (_, table) => {
    const texts = Object.entries(table);
    expect(texts.filter(([, { en, es }]) => en.trim() === '' || es.trim() === '')).toEqual([]);
    // Short ones may be the same in both ("Total").
    expect(texts.filter(([, { en, es }]) => en === es && en.length > 4)).toEqual([]);
  });

  it.each(TABLES)(
    'are whole sentences where they end in a full stop, in both languages alike: %s',
    (_, table) => {
      const ends = (text: string): boolean => /[.?]$/.test(text);
      expect(Object.entries(table).filter(([, { en, es }]) => ends(en) !== ends(es))).toEqual([]);
    },
  );

  it('mean one kind of quantity each, by the unit beside them', () => {
    const kinds = new Map<string, Set<string>>();
    for (const { figures, working } of ALL) {
      for (const { label, unit } of [...figures, ...working.flatMap(({ lines }) => lines)])
        kinds.set(label, (kinds.get(label) ?? new Set<string>()).add(UNITS[unit].dimension));
    }
    const several = [...kinds].filter(([, dimensions]) => dimensions.size > 1).map(([label]) => label);
    // Tolerance, difference and mean are of what they are said of; an absolute gauge reads an absolute pressure.
    expect(several.sort()).toEqual(['difference', 'gaugeReading', 'timeWeightedMean', 'tolerance']);
    expect(kinds.get('gaugeAccuracy')).toEqual(new Set(['pressureDifference']));
    expect(kinds.get('superheat')).toEqual(new Set(['temperatureDifference']));
  });

  it('do not call two figures of one judgement or two lines of one working the same', () => {
    const doubled = ALL.flatMap(({ figures, working }) => [figures, ...working.map(({ lines }) => lines)])
      .map((lines) => lines.map(({ label }) => `${figureWords(label)?.en}`))
      .filter((names) => new Set(names).size < names.length);
    expect(doubled.map((names) => names.join(' | '))).toEqual([]);
  });
});

describe('figureWords', () => {
  it('counts what is counted', () => {
    expect(figureWords('leg2Current')).toEqual({ en: 'Current, line 2', es: 'Corriente, línea 2' });
    expect(figureWords('movement12')?.en).toBe('Cylinder movement 12');
    expect(figureWords('voltage1')?.es).toBe('Voltaje 1');
  });

  it.each(['', 'nothing', 'constructor', '__proto__', 'toString', 'superheat2', 'leg2', '7'])(
    'has no name for %j',
    (label) => {
      expect(figureWords(label)).toBeNull();
    },
  );
});
