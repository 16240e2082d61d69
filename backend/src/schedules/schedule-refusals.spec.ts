import { describe, expect, it } from '@jest/globals';
import { line, LINE, problemsOf, read, reasonsOf } from './schedule-csv.fixture';

const EVAPORATING = 'Evaporating temperature (°F)';
const TEMPERATURES = { units: ['degC', 'degF'] };
const second = (changes: Record<string, string>) => line({ 'Fixture tag': 'ME-02', ...changes });

const LEVELS: Readonly<Record<string, string>> = {
  System: 'system',
  'Suction group': 'suctionGroup',
  Circuit: 'circuit',
};

const oneOf = (written: string) => ({
  code: 'unknownWord',
  params: expect.objectContaining({
    words: written.split(', ').map((write) => expect.objectContaining({ write })),
  }),
});

describe('parseSchedule, given a table with problems', () => {
  it.each(Object.keys(LINE))('names the missing column %s and the headings that are there', (heading) => {
    const name = heading.replace(/ \(.*/, '');
    expect(reasonsOf(read([line({ [heading]: undefined, Colour: 'white' })]))).toEqual([
      {
        row: 1,
        column: null,
        code: 'missingColumn',
        params: {
          column: expect.any(String),
          heading: name,
          found: [...Object.keys(LINE).filter((other) => other !== heading), 'Colour'],
          moreCount: 0,
        },
      },
    ]);
  });

  it.each(Object.keys(LINE))('names a blank needed cell of %s', (heading) => {
    expect(reasonsOf(read([line({ [heading]: '' })]))).toEqual([
      {
        row: 2,
        column: heading,
        ...(heading in LEVELS
          ? { code: 'missingName', params: { level: LEVELS[heading] } }
          : {
              code: 'missingValue',
              params: { column: expect.any(String), heading: heading.replace(/ \(.*/, '') },
            }),
      },
    ]);
  });

  it('says how many more headings there are than it lists, and cuts long ones', () => {
    const others = Array.from({ length: 45 }, (_, index) => [`${'x'.repeat(50)}${index}`, '1']);
    const [problem] = problemsOf(read([line({ System: undefined, ...Object.fromEntries(others) })]));
    expect(problem?.reason).toMatchObject({ code: 'missingColumn', params: { moreCount: 14 } });
    const { found } = problem?.reason.params as { found: string[] };
    expect([found.length, found.at(-1)]).toEqual([40, `${'x'.repeat(40)}…`]);
  });

  it.each([
    [
      'Temperature class',
      'cool',
      {
        code: 'unknownWord',
        params: {
          text: 'cool',
          words: [
            { word: 'low', write: 'low' },
            { word: 'medium', write: 'medium' },
            { word: 'high', write: 'high' },
          ],
        },
      },
    ],
    ['System type', 'engine', oneOf('rack, condensing unit, CO2 booster')],
    ['Feed', 'pipe', oneOf('home run, shared loop')],
    ['Control', 'magic', oneOf('EPR, suction stop, liquid solenoid, electronic valve')],
    ['Defrost', 'sun', oneOf('off-time, electric, hot gas, none')],
    ['Fixture type', 'shelf', oneOf('case, walk-in')],
    ['Valve', 'ball', oneOf('thermostatic, electronic')],
    ['Evaporating basis', 'bubble', oneOf('dew, mean')],
    ['Refrigerant', 'R-404', { code: 'unknownRefrigerant', params: { text: 'R-404' } }],
    [EVAPORATING, 'cold', { code: 'notANumber', params: { text: 'cold' } }],
    [EVAPORATING, '=20', { code: 'notANumber', params: { text: '=20' } }],
    [EVAPORATING, '-77', { code: 'outOfRange', params: { text: '-77', low: -76, high: 68, unit: 'degF' } }],
    [EVAPORATING, '20 °C', { code: 'twoUnits', params: { cell: 'degC', heading: 'degF' } }],
    [EVAPORATING, '20 psig', { code: 'unknownUnit', params: { text: 'psig', ...TEMPERATURES } }],
    [
      'Superheat high (°F)',
      '37',
      { code: 'outOfRange', params: { text: '37', low: 0.9, high: 36, unit: 'degF_diff' } },
    ],
    [
      'Length (ft)',
      '8 cubits',
      { code: 'unknownUnit', params: { text: 'cubits', units: ['ft', 'm', 'in'] } },
    ],
    ['Length (ft)', 'TBD', { code: 'notANumber', params: { text: 'TBD' } }],
    [
      'Load (kW)',
      '12000',
      { code: 'outOfRange', params: { text: '12000', low: 0.05, high: 500, unit: 'kW' } },
    ],
    ['Coils', '0', { code: 'notAWholeNumber', params: { text: '0', lowCount: 1, highCount: 40 } }],
    ['Coils', '1.5', { code: 'notAWholeNumber', params: { text: '1.5', lowCount: 1, highCount: 40 } }],
    [
      'Defrosts per day',
      '48',
      { code: 'notAWholeNumber', params: { text: '48', lowCount: 0, highCount: 24 } },
    ],
    ['Area', '#REF!', { code: 'spreadsheetError', params: { text: '#REF!' } }],
    ['Circuit', 'A'.repeat(41), { code: 'textTooLong', params: { characterCount: 41, upTo: 40 } }],
  ])('refuses in the column %s the cell %j', (heading, cell, reason) => {
    expect(reasonsOf(read([line({ [heading]: cell })]))).toEqual([{ row: 2, column: heading, ...reason }]);
  });

  it('names an unknown unit of a heading once, at the heading', () => {
    const lines = [line({ 'Length (cubits)': '8' }), second({ 'Length (cubits)': '9' })];
    expect(reasonsOf(read(lines))).toEqual([
      {
        row: 1,
        column: 'Length (cubits)',
        code: 'unknownUnit',
        params: { text: 'cubits', units: ['ft', 'm', 'in'] },
      },
    ]);
  });

  it('asks for a missing unit once in a column', () => {
    const lines = [
      line({ Length: '8' }),
      second({ Length: '9' }),
      second({ 'Fixture tag': 'ME-03', Length: '9 ft' }),
    ];
    expect(reasonsOf(read(lines))).toEqual([
      { row: 2, column: 'Length', code: 'missingUnit', params: { units: ['ft', 'm', 'in'] } },
    ]);
  });

  it('refuses two headings that mean the same column', () => {
    expect(reasonsOf(read([line({ Ckt: 'A1' })]))).toEqual([
      { row: 1, column: 'Ckt', code: 'sameColumn', params: { other: 'Circuit' } },
    ]);
  });

  it('takes tags that differ in accents only for one', () => {
    const [problem] = problemsOf(read([line({ 'Fixture tag': 'CAFÉ' }), line({ 'Fixture tag': 'cafe' })]));
    expect(problem).toMatchObject({ row: 3, column: 'Fixture tag' });
  });

  it('refuses a fixture tag that is used twice', () => {
    expect(reasonsOf(read([line(), line({ 'Fixture tag': 'me-01' })]))[0]).toEqual({
      row: 3,
      column: 'Fixture tag',
      code: 'fixtureTagTwice',
      params: { text: 'me-01', row: 2 },
    });
  });

  it.each([{ 'Suction group': 'AS-2' }, { System: 'Rack B' }])(
    'refuses a circuit that is elsewhere already, at %j',
    (place) => {
      expect(reasonsOf(read([line(), second(place)]))).toEqual([
        {
          row: 3,
          column: 'Circuit',
          code: 'circuitElsewhere',
          params: { circuit: 'A1', suctionGroup: 'AS-1', system: 'Rack A', row: 2 },
        },
      ]);
    },
  );

  it.each([
    ['Refrigerant', 'R-449A', { level: 'system', name: 'Rack A' }],
    ['SST (°F)', '16', { level: 'suctionGroup', name: 'AS-1' }],
    ['Area', 'Deli', { level: 'circuit', name: 'A1' }],
    ['Load (W)', '800', { level: 'circuit', name: 'A1' }],
  ])('refuses lines that disagree about %s', (heading, other, part) => {
    const first = { Area: 'Meat', 'SST (°F)': '18', 'Load (W)': '900' };
    expect(reasonsOf(read([line(first), second({ ...first, [heading]: other })]))).toEqual([
      { row: 3, column: heading, code: 'rowsDisagree', params: { row: 2, ...part } },
    ]);
  });

  it('refuses a circuit that stands apart with other data', () => {
    const lines = [
      line({ Area: 'Meat' }),
      second({ Circuit: 'A2', Area: 'Deli' }),
      line({ 'Fixture tag': 'ME-03', Area: 'Deli' }),
    ];
    expect(reasonsOf(read(lines))).toEqual([
      { row: 4, column: 'Area', code: 'rowsDisagree', params: { row: 2, level: 'circuit', name: 'A1' } },
    ]);
  });

  it('does not take a suction group over from another system', () => {
    const problems = reasonsOf(
      read([line(), second({ System: 'Rack B', 'Suction group': '', Circuit: 'B1' })]),
    );
    expect(problems).toEqual([
      { row: 3, column: 'Suction group', code: 'missingName', params: { level: 'suctionGroup' } },
    ]);
  });

  it('names the first of several lines without a place', () => {
    const lines = [line({ System: '' }), second({ System: '' }), second({ 'Fixture tag': 'ME-03' })];
    expect(problemsOf(read(lines)).map(({ row }) => row)).toEqual([2]);
  });

  it.each([
    [{ 'Superheat low (°F)': '10' }, 'Superheat high (°F)', 'superheatBandEmpty'],
    [{ 'Discharge air (°F)': '20' }, 'Discharge air (°F)', 'dischargeAirTooCold'],
    [{ 'Temperature class': 'low', [EVAPORATING]: '25' }, EVAPORATING, 'tooWarmForLow'],
    [{ [EVAPORATING]: '-25' }, EVAPORATING, 'tooColdForMedium'],
    [{ 'Temperature class': 'high', [EVAPORATING]: '-25' }, EVAPORATING, 'tooColdForHigh'],
    [{ 'SST (°F)': '21' }, EVAPORATING, 'colderThanSuction'],
    [{ Defrost: 'none', Defrosts: '2' }, 'Defrosts', 'defrostsWithoutDefrost'],
    [{ Defrosts: '0' }, 'Defrosts', 'defrostWithoutDefrosts'],
  ])('refuses values that contradict one another: %j', (changes, column, code) => {
    expect(reasonsOf(read([line(changes)]))).toEqual([{ row: 2, column, code, params: {} }]);
  });

  it('collects the problems of all lines in their order', () => {
    const lines = [
      line({ Feed: 'x', [EVAPORATING]: 'y' }),
      second({ Feed: '', 'Superheat low (°F)': '9.5 °C' }),
    ];
    expect(problemsOf(read(lines)).map(({ row, column }) => [row, column])).toEqual([
      [2, EVAPORATING],
      [2, 'Feed'],
      [3, 'Superheat low (°F)'],
    ]);
  });

  it('lists 200 problems and says how many more there are', () => {
    const lines = Array.from({ length: 250 }, (_, index) => line({ 'Fixture tag': `F${index}`, Valve: 'x' }));
    const problems = reasonsOf(read(lines));
    expect(problems).toHaveLength(201);
    expect(problems[200]).toEqual({ row: 202, column: null, code: 'moreProblems', params: { count: 50 } });
  });
});
