import { describe, expect, it } from '@jest/globals';
import { parseSchedule } from './schedule-parser';
import {
  bytesOf,
  circuitsOf,
  csvOf,
  fixturesOf,
  line,
  onlyCircuit,
  onlyFixture,
  read,
  scheduleOf,
} from './schedule-csv.fixture';

describe('parseSchedule', () => {
  it('reads every column into SI units', () => {
    const lines = [
      line({
        'System type': 'CO2 booster',
        'SST (°F)': '18',
        'Circuit description': 'Meat line-up',
        Area: 'Meat',
        Feed: 'Loop',
        Control: 'Suction stop',
        'Load (BTU/h)': '12,000',
        Defrost: 'Hot gas',
        'Defrosts/day': '3',
        'Fail-safe (min)': '20',
        'Termination (°F)': '50',
        'Drip (min)': '5',
        'Fixture type': 'Walk-in',
        Description: 'Meat cooler',
        'Length (ft)': '8',
        'Evaporating basis': 'Mean',
        Valve: 'EEV',
        Coils: '2',
      }),
    ];
    expect(scheduleOf(read(lines))).toEqual({
      systems: [
        {
          name: 'Rack A',
          kind: 'co2Booster',
          refrigerant: 'R-448A',
          suctionGroups: [
            {
              name: 'AS-1',
              temperatureClass: 'medium',
              saturatedSuctionTemperatureK: expect.closeTo(265.372, 3),
              circuits: [
                {
                  code: 'A1',
                  description: 'Meat line-up',
                  area: 'Meat',
                  temperatureClass: 'medium',
                  feed: 'sharedLoop',
                  control: 'suctionStop',
                  loadW: expect.closeTo(3516.85, 2),
                  defrost: {
                    type: 'hotGas',
                    perDay: 3,
                    failSafeS: 1200,
                    terminationTemperatureK: expect.closeTo(283.15, 3),
                    dripS: 300,
                  },
                  fixtures: [
                    {
                      tag: 'ME-01',
                      description: 'Meat cooler',
                      kind: 'walkIn',
                      lengthM: expect.closeTo(2.4384, 6),
                      evaporatingTemperatureK: expect.closeTo(266.483, 3),
                      evaporatingBasis: 'mean',
                      dischargeAirTemperatureK: expect.closeTo(270.928, 3),
                      superheatLowK: expect.closeTo(3.3333, 4),
                      superheatHighK: expect.closeTo(5.5556, 4),
                      valveKind: 'electronic',
                      coilCount: 2,
                    },
                  ],
                },
              ],
            },
          ],
        },
      ],
    });
  });

  it('takes the documented defaults for columns that are not there', () => {
    const [system] = scheduleOf(read([line()])).systems;
    expect(system?.kind).toBe('rack');
    expect(system?.suctionGroups[0]?.saturatedSuctionTemperatureK).toBeCloseTo(266.483, 3);
    expect(onlyCircuit({})).toMatchObject({
      description: '',
      area: '',
      feed: 'homeRun',
      control: 'evaporatorPressureRegulator',
      loadW: null,
      defrost: { type: 'offTime', perDay: 4, failSafeS: null, terminationTemperatureK: null, dripS: null },
    });
    expect(onlyFixture({})).toMatchObject({
      description: '',
      kind: 'case',
      lengthM: null,
      evaporatingBasis: 'dew',
      valveKind: 'thermostatic',
      coilCount: 1,
    });
  });

  it('takes the same defaults for blank cells and dashes', () => {
    const blank = { 'Length (ft)': '', 'Load (W)': ' ', Feed: '-', 'Termination (°F)': 'n/a', Coils: '—' };
    expect(onlyCircuit(blank)).toMatchObject({ feed: 'homeRun', loadW: null });
    expect(onlyFixture(blank)).toMatchObject({ lengthM: null, coilCount: 1 });
  });

  it.each([
    [
      { 'Temperature class': 'LT', 'Evaporating temperature (°F)': '-20' },
      { type: 'electric', perDay: 4 },
    ],
    [{ Defrost: 'none' }, { type: 'none', perDay: 0 }],
  ])('takes the default defrost that goes with %j', (changes, defrost) => {
    expect(onlyCircuit(changes).defrost).toMatchObject(defrost);
  });

  it('takes defaults from what the schedule says elsewhere', () => {
    expect(scheduleOf(read([line({ Refrigerant: 'CO2' })])).systems[0]).toMatchObject({
      refrigerant: 'R-744',
      kind: 'co2Booster',
    });
    expect(onlyFixture({ Control: 'electronic valve' }).valveKind).toBe('electronic');
    expect(onlyFixture({ Description: 'Dairy walk-in cooler' }).kind).toBe('walkIn');
    expect(onlyCircuit({ Description: 'Deli case' }).description).toBe('Deli case');
  });

  it('takes blank cells of a circuit over from its line above', () => {
    const blank = {
      System: '',
      Refrigerant: '',
      'Suction group': '',
      Circuit: '',
      'Temperature class': '',
      'Load (W)': '',
    };
    const lines = [line({ 'Load (W)': '900' }), line({ ...blank, 'Fixture tag': 'ME-02' })];
    const [circuit, ...others] = circuitsOf(scheduleOf(read(lines)));
    expect(others).toEqual([]);
    expect(circuit).toMatchObject({ loadW: 900, fixtures: [{ tag: 'ME-01' }, { tag: 'ME-02' }] });
  });

  it('starts a new circuit of the suction group above where only the circuit is given', () => {
    const above = { System: '', Refrigerant: '', 'Suction group': '' };
    const schedule = scheduleOf(read([line(), line({ ...above, Circuit: 'A2', 'Fixture tag': 'ME-02' })]));
    expect(schedule.systems).toHaveLength(1);
    expect(circuitsOf(schedule).map(({ code }) => code)).toEqual(['A1', 'A2']);
  });

  it('joins lines of a circuit that stand apart, whatever the capitals', () => {
    const lines = [
      line({ Area: 'Meat' }),
      line({ 'Suction group': 'AS-2', Circuit: 'A2', 'Fixture tag': 'PR-01', Area: 'Produce' }),
      line({ System: '', 'Suction group': '', Circuit: 'a1', 'Fixture tag': 'ME-02', Area: 'MEAT' }),
    ];
    const circuits = circuitsOf(scheduleOf(read(lines)));
    expect(circuits.map(({ code, fixtures }) => [code, fixtures.length])).toEqual([
      ['A1', 2],
      ['A2', 1],
    ]);
  });

  it('gives a suction group the class of its coldest circuit and the suction of its coldest fixture', () => {
    const cold = {
      Circuit: 'A2',
      'Fixture tag': 'FA-01',
      'Temperature class': 'low',
      'Evaporating temperature (°F)': '-20',
    };
    const [group] = scheduleOf(read([line(), line(cold)])).systems[0]?.suctionGroups ?? [];
    expect(group?.temperatureClass).toBe('low');
    expect(group?.saturatedSuctionTemperatureK).toBeCloseTo(244.261, 3);
  });

  it('keeps the same suction group name in two systems apart', () => {
    const other = { System: 'Rack B', Circuit: 'B1', 'Fixture tag': 'FA-01' };
    const { systems } = scheduleOf(read([line(), line(other)]));
    expect(systems.map(({ name, suctionGroups }) => [name, suctionGroups.length])).toEqual([
      ['Rack A', 1],
      ['Rack B', 1],
    ]);
  });

  it('keeps what looks like a formula as the text it is', () => {
    expect(onlyFixture({ Description: '=HYPERLINK("http://example.com")' }).description).toBe(
      '=HYPERLINK("http://example.com")',
    );
    expect(onlyFixture({ 'Fixture tag': '@SUM(A1)' }).tag).toBe('@SUM(A1)');
    expect(onlyFixture({ 'Superheat low (°F)': '+6' }).superheatLowK).toBeCloseTo(3.333, 3);
  });

  it('names the headings from which nothing was taken', () => {
    const reading = read([line({ 'Volts/Ph': '208/3', Maker: 'none' })]);
    expect(reading).toMatchObject({ ok: true, ignoredColumns: ['Volts/Ph', 'Maker'] });
  });

  it('asks the given function for the refrigerant', () => {
    const bytes = bytesOf(csvOf([line({ Refrigerant: 'House blend' })]));
    expect(scheduleOf(parseSchedule(bytes, (text) => `${text}!`)).systems[0]?.refrigerant).toBe(
      'House blend!',
    );
    expect(parseSchedule(bytes, () => undefined)).toMatchObject({ ok: false, code: 'scheduleRefused' });
  });

  it('does not change the bytes', () => {
    const bytes = bytesOf(csvOf([line()]));
    const copy = bytes.slice();
    expect(fixturesOf(scheduleOf(parseSchedule(bytes)))).toHaveLength(1);
    expect(bytes).toEqual(copy);
  });
});
