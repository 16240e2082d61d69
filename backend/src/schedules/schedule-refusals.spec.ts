import { describe, expect, it } from '@jest/globals';
import { line, LINE, problemsOf, read } from './schedule-csv.fixture';

const EVAPORATING = 'Evaporating temperature (°F)';
const second = (changes: Record<string, string>) => line({ 'Fixture tag': 'ME-02', ...changes });

describe('parseSchedule, given a table with problems', () => {
  it.each(Object.keys(LINE))('names the missing column %s and the headings that are there', (heading) => {
    const name = heading.replace(/ \(.*/, '');
    const problems = problemsOf(read([line({ [heading]: undefined, Colour: 'white' })]));
    expect(problems).toHaveLength(1);
    expect(problems[0]).toMatchObject({ row: 1, column: null });
    expect(problems[0]?.reason).toContain(`The column "${name}" is missing`);
    expect(problems[0]?.reason).toContain('"Colour"');
  });

  it.each(Object.keys(LINE))('names a blank needed cell of %s', (heading) => {
    expect(problemsOf(read([line({ [heading]: '' })]))).toEqual([
      { row: 2, column: heading, reason: expect.stringContaining('is missing') },
    ]);
  });

  it.each([
    ['Temperature class', 'cool', '"cool" is not a known word here; write one of: low, medium, high.'],
    ['System type', 'engine', 'write one of: rack, condensing unit, CO2 booster.'],
    ['Feed', 'pipe', 'write one of: home run, shared loop.'],
    ['Control', 'magic', 'write one of: EPR, suction stop, liquid solenoid, electronic valve.'],
    ['Defrost', 'sun', 'write one of: off-time, electric, hot gas, none.'],
    ['Fixture type', 'shelf', 'write one of: case, walk-in.'],
    ['Valve', 'ball', 'write one of: thermostatic, electronic.'],
    ['Evaporating basis', 'bubble', 'write one of: dew, mean.'],
    [
      'Refrigerant',
      'R-404',
      '"R-404" is not a known refrigerant; write its full designation, such as R-448A.',
    ],
    [EVAPORATING, 'cold', '"cold" is not a number'],
    [EVAPORATING, '=20', '"=20" is not a number'],
    [EVAPORATING, '-77', 'is out of the plausible range, -76 °F to 68 °F'],
    [EVAPORATING, '20 °C', 'The cell says °C and its heading °F; write one of the two.'],
    [EVAPORATING, '20 psig', 'The unit "psig" is not known here; write °C or °F.'],
    ['Superheat high (°F)', '37', 'is out of the plausible range, 0.9 °F to 36 °F'],
    ['Length (ft)', '8 cubits', 'The unit "cubits" is not known here; write ft, m or in.'],
    ['Length (ft)', 'TBD', '"TBD" is not a number'],
    ['Load (kW)', '12000', 'is out of the plausible range, 0.05 kW to 500 kW'],
    ['Coils', '0', '"0" is not a whole number from 1 to 40'],
    ['Coils', '1.5', '"1.5" is not a whole number from 1 to 40'],
    ['Defrosts per day', '48', '"48" is not a whole number from 0 to 24'],
    ['Area', '#REF!', '"#REF!" is an error of the spreadsheet'],
    ['Circuit', 'A'.repeat(41), 'The text has 41 characters; shorten it to 40.'],
  ])('refuses in the column %s the cell %j', (heading, cell, reason) => {
    expect(problemsOf(read([line({ [heading]: cell })]))).toEqual([
      { row: 2, column: heading, reason: expect.stringContaining(reason) },
    ]);
  });

  it('names an unknown unit of a heading once, at the heading', () => {
    const lines = [line({ 'Length (cubits)': '8' }), second({ 'Length (cubits)': '9' })];
    expect(problemsOf(read(lines))).toEqual([
      {
        row: 1,
        column: 'Length (cubits)',
        reason: 'The unit "cubits" is not known here; write ft, m or in.',
      },
    ]);
  });

  it('asks for a missing unit once in a column', () => {
    const lines = [
      line({ Length: '8' }),
      second({ Length: '9' }),
      second({ 'Fixture tag': 'ME-03', Length: '9 ft' }),
    ];
    expect(problemsOf(read(lines))).toEqual([
      {
        row: 2,
        column: 'Length',
        reason: 'The unit is missing; write it in brackets into the heading: ft, m or in.',
      },
    ]);
  });

  it('refuses two headings that mean the same column', () => {
    expect(problemsOf(read([line({ Ckt: 'A1' })]))).toEqual([
      { row: 1, column: 'Ckt', reason: '"Circuit" is read as Circuit too; rename or remove one of the two.' },
    ]);
  });

  it('takes tags that differ in accents only for one', () => {
    const [problem] = problemsOf(read([line({ 'Fixture tag': 'CAFÉ' }), line({ 'Fixture tag': 'cafe' })]));
    expect(problem).toMatchObject({ row: 3, column: 'Fixture tag' });
  });

  it('refuses a fixture tag that is used twice', () => {
    const [problem] = problemsOf(read([line(), line({ 'Fixture tag': 'me-01' })]));
    expect(problem).toMatchObject({ row: 3, column: 'Fixture tag' });
    expect(problem?.reason).toContain('"me-01" is used on line 2 already');
  });

  it.each([{ 'Suction group': 'AS-2' }, { System: 'Rack B' }])(
    'refuses a circuit that is elsewhere already, at %j',
    (place) => {
      const problems = problemsOf(read([line(), second(place)]));
      expect(problems).toHaveLength(1);
      expect(problems[0]).toMatchObject({ row: 3, column: 'Circuit' });
      expect(problems[0]?.reason).toContain(
        '"A1" stands in suction group "AS-1" of system "Rack A" on line 2',
      );
    },
  );

  it.each([
    ['Refrigerant', 'R-449A', 'system "Rack A"'],
    ['SST (°F)', '16', 'suction group "AS-1"'],
    ['Area', 'Deli', 'circuit "A1"'],
    ['Load (W)', '800', 'circuit "A1"'],
  ])('refuses lines that disagree about %s', (heading, other, part) => {
    const first = { Area: 'Meat', 'SST (°F)': '18', 'Load (W)': '900' };
    expect(problemsOf(read([line(first), second({ ...first, [heading]: other })]))).toEqual([
      {
        row: 3,
        column: heading,
        reason: expect.stringContaining(`Line 2 says something else about the ${part}`),
      },
    ]);
  });

  it('refuses a circuit that stands apart with other data', () => {
    const lines = [
      line({ Area: 'Meat' }),
      second({ Circuit: 'A2', Area: 'Deli' }),
      line({ 'Fixture tag': 'ME-03', Area: 'Deli' }),
    ];
    expect(problemsOf(read(lines))).toEqual([
      { row: 4, column: 'Area', reason: expect.stringContaining('Line 2 says') },
    ]);
  });

  it('does not take a suction group over from another system', () => {
    const problems = problemsOf(
      read([line(), second({ System: 'Rack B', 'Suction group': '', Circuit: 'B1' })]),
    );
    expect(problems).toEqual([
      { row: 3, column: 'Suction group', reason: expect.stringContaining('is missing') },
    ]);
  });

  it('names the first of several lines without a place', () => {
    const lines = [line({ System: '' }), second({ System: '' }), second({ 'Fixture tag': 'ME-03' })];
    expect(problemsOf(read(lines)).map(({ row }) => row)).toEqual([2]);
  });

  it.each([
    [{ 'Superheat low (°F)': '10' }, 'Superheat high (°F)', 'The high superheat is not above the low one'],
    [{ 'Discharge air (°F)': '20' }, 'Discharge air (°F)', 'Discharge air can not be as cold'],
    [
      { 'Temperature class': 'low', [EVAPORATING]: '25' },
      EVAPORATING,
      'Too warm for a low-temperature circuit',
    ],
    [{ [EVAPORATING]: '-25' }, EVAPORATING, 'Too cold for a medium-temperature circuit'],
    [{ 'SST (°F)': '21' }, EVAPORATING, 'Colder than the saturated suction temperature'],
    [{ Defrost: 'none', Defrosts: '2' }, 'Defrosts', 'There is no defrost; write 0 here'],
    [{ Defrosts: '0' }, 'Defrosts', 'No defrosts a day'],
  ])('refuses values that contradict one another: %j', (changes, column, reason) => {
    expect(problemsOf(read([line(changes)]))).toEqual([
      { row: 2, column, reason: expect.stringContaining(reason) },
    ]);
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
    const problems = problemsOf(read(lines));
    expect(problems).toHaveLength(201);
    expect(problems[200]).toEqual({
      row: 202,
      column: null,
      reason: expect.stringContaining('50 more problems follow'),
    });
  });
});
