// Writes harbor-street-schedule.csv, the refrigeration schedule of an invented store: node backend/demo/make-schedule.mjs
// Lengths, loads and temperatures follow the open data of a typical supermarket in openstudio-standards (NREL).

import { writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';

const HEADINGS = [
  ...[
    'System',
    'System type',
    'Refrigerant',
    'Suction group',
    'SST (°F)',
    'Circuit',
    'Circuit description',
    'Area',
  ],
  ...['Temp class', 'Feed', 'Control', 'Load (BTU/h)', 'Defrost', 'Defrosts per day', 'Fail-safe (min)'],
  ...[
    'Termination (°F)',
    'Drip (min)',
    'Fixture tag',
    'Fixture type',
    'Description',
    'Length (ft)',
    'Evap temp (°F)',
  ],
  ...[
    'Evaporating basis',
    'Discharge air (°F)',
    'Superheat low (°F)',
    'Superheat high (°F)',
    'Valve',
    'Coils',
  ],
];

const GROUPS = {
  'AS-1': ['Rack A', 'Rack', 'R-448A', 'AS-1', 18],
  'AS-2': ['Rack A', 'Rack', 'R-448A', 'AS-2', 22],
  'AS-3': ['Rack A', 'Rack', 'R-448A', 'AS-3', 23],
  'BS-1': ['Rack B', 'Rack', 'R-449A', 'BS-1', -13],
  'BS-2': ['Rack B', 'Rack', 'R-449A', 'BS-2', -27],
};

/** [type, times a day, fail-safe min, termination °F, drip min] */
const OFF_TIME = ['Off-time', 4, 45, '', ''];
const BOX_OFF_TIME = ['Off-time', 4, 30, '', ''];
const ISLAND_ELECTRIC = ['Electric', 2, 30, 50, 5];
const DOOR_ELECTRIC = ['Electric', 1, 46, 54, 10];
const HOT_GAS = ['Hot gas', 1, 24, 60, 8];
const BOX_ELECTRIC = ['Electric', 4, 30, 55, 45];

/** A kind of fixture: °F evaporating, °F discharge air, superheat band in °F, BTU/h a foot (of a box: a square foot). */
const KINDS = {
  service: { tempClass: 'MT', evaporating: 20, air: 28, band: [6, 10], perFoot: 330, defrost: OFF_TIME },
  island: { tempClass: 'MT', evaporating: 25, air: 30, band: [6, 8], perFoot: 388, defrost: ISLAND_ELECTRIC },
  open: { tempClass: 'MT', evaporating: 28, air: 33, band: [6, 8], perFoot: 1235, defrost: OFF_TIME },
  door: { tempClass: 'MT', evaporating: 30, air: 34.5, band: [6, 8], perFoot: 293, defrost: OFF_TIME },
  frozenDoor: {
    tempClass: 'LT',
    evaporating: -11,
    air: -4,
    band: [4, 6],
    perFoot: 456,
    defrost: DOOR_ELECTRIC,
  },
  iceCreamDoor: {
    tempClass: 'LT',
    evaporating: -17,
    air: -11,
    band: [3, 5],
    perFoot: 493,
    defrost: DOOR_ELECTRIC,
  },
  coffin: {
    tempClass: 'LT',
    evaporating: -24,
    air: -19,
    band: [3, 5],
    perFoot: 250,
    defrost: ISLAND_ELECTRIC,
  },
  cooler: { tempClass: 'MT', evaporating: 25, air: 35, band: [6, 10], perFoot: 62, defrost: BOX_OFF_TIME },
  prepRoom: { tempClass: 'HT', evaporating: 34, air: 50, band: [6, 10], perFoot: 58, defrost: BOX_OFF_TIME },
  freezer: { tempClass: 'LT', evaporating: -25, air: -15, band: [4, 6], perFoot: 66, defrost: BOX_ELECTRIC },
};

const times = (count, item) => Array.from({ length: count }, () => item);
const HOME = { feed: 'Home run', control: 'EPR' };
const LOOP = { feed: 'Shared loop', control: 'Suction stop' };
const SOLENOID = { feed: 'Home run', control: 'Liquid solenoid' };
const ELECTRONIC = { feed: 'Shared loop', control: 'Electronic valve' };

/** Circuits of cases: suction group, area, tag, description, kind, how they are piped, lengths in ft (circuit by circuit), more. */
const CASES = [
  ['AS-1', 'Meat', 'ME', 'Service meat case', 'service', HOME, times(8, [4, 6])],
  ['AS-1', 'Seafood', 'SF', 'Service seafood case', 'service', HOME, times(2, [4, 4])],
  ['AS-1', 'Deli', 'DL', 'Service deli case', 'service', LOOP, times(6, [4, 6])],
  ['AS-1', 'Bakery', 'BK', 'Service bakery case', 'service', HOME, [[4], [4], [4, 6], [4, 6], [4, 4]]],
  [
    'AS-2',
    'Produce',
    'PR',
    'Open multi-deck produce case',
    'open',
    LOOP,
    times(4, [4, 6]),
    { coils: [1, 2] },
  ],
  ['AS-2', 'Produce', 'PI', 'Wide produce island', 'island', LOOP, times(2, [6, 6]), { coils: [2, 3] }],
  ['AS-2', 'Deli', 'DI', 'Deli island', 'island', HOME, times(2, [6, 6]), { coils: [2, 2] }],
  ['AS-2', 'Deli', 'GG', 'Open grab-and-go case', 'open', HOME, [[4], [4], [4, 4]]],
  [
    'AS-3',
    'Dairy',
    'DY',
    'Open multi-deck dairy case',
    'open',
    ELECTRONIC,
    times(4, [4, 6]),
    { coils: [1, 2] },
  ],
  ['AS-3', 'Dairy', 'DD', 'Dairy reach-in, 3 doors', 'door', ELECTRONIC, times(3, [7.5, 7.5])],
  ['AS-3', 'Beverage', 'BV', 'Beverage reach-in, 3 doors', 'door', HOME, times(3, [7.5, 7.5])],
  [
    'BS-1',
    'Frozen aisle 1',
    'FA',
    'Frozen food reach-in, 3 doors',
    'frozenDoor',
    HOME,
    times(6, [7.5, 7.5, 7.5]),
  ],
  ['BS-1', 'Frozen aisle 2', 'FB', 'Frozen food reach-in, 3 doors', 'frozenDoor', LOOP, times(5, [7.5, 7.5])],
  [
    'BS-1',
    'Frozen aisle 3',
    'FC',
    'Frozen food reach-in, 3 doors',
    'frozenDoor',
    HOME,
    times(4, [7.5, 7.5]),
    { defrost: HOT_GAS },
  ],
  ['BS-2', 'Frozen aisle 3', 'IC', 'Ice cream reach-in, 3 doors', 'iceCreamDoor', LOOP, times(8, [7.5, 7.5])],
  ['BS-2', 'Frozen aisle 3', 'CF', 'Ice cream coffin', 'coffin', HOME, [[6, 6]], { coils: [1, 1] }],
];

/** Walk-in boxes, a circuit each: suction group, area, tag, name, kind, how it is piped, width and depth in ft, unit coolers. */
const BOXES = [
  ['AS-1', 'Meat', 'WI-01', 'Meat walk-in cooler', 'cooler', HOME, 20, 20, 2],
  ['AS-1', 'Meat', 'WI-02', 'Meat preparation room', 'prepRoom', HOME, 20, 24, 2],
  ['AS-1', 'Seafood', 'WI-03', 'Seafood walk-in cooler', 'cooler', SOLENOID, 8, 10, 1],
  ['AS-1', 'Deli', 'WI-04', 'Deli walk-in cooler', 'cooler', SOLENOID, 10, 12, 1],
  ['AS-2', 'Produce', 'WI-05', 'Produce walk-in cooler', 'cooler', HOME, 20, 20, 2],
  ['AS-2', 'Floral', 'WI-06', 'Floral walk-in cooler', 'cooler', SOLENOID, 8, 10, 1],
  ['AS-2', 'Bakery', 'WI-07', 'Bakery walk-in cooler', 'cooler', SOLENOID, 10, 10, 1],
  ['AS-3', 'Dairy', 'WI-08', 'Dairy walk-in cooler', 'cooler', HOME, 22, 30, 2],
  ['AS-3', 'Back room', 'WI-09', 'Beverage walk-in cooler', 'cooler', HOME, 16, 24, 2],
  ['AS-3', 'Back room', 'WI-10', 'Order pick-up walk-in cooler', 'cooler', SOLENOID, 10, 16, 1],
  ['BS-2', 'Back room', 'WI-11', 'Grocery walk-in freezer', 'freezer', SOLENOID, 20, 26, 2],
  ['BS-2', 'Bakery', 'WI-12', 'Bakery walk-in freezer', 'freezer', SOLENOID, 10, 13, 1],
  ['BS-2', 'Back room', 'WI-13', 'Ice cream walk-in freezer', 'freezer', SOLENOID, 10, 12, 1],
  ['BS-2', 'Meat', 'WI-14', 'Meat walk-in freezer', 'freezer', SOLENOID, 8, 10, 1],
  ['BS-2', 'Back room', 'WI-15', 'Order pick-up walk-in freezer', 'freezer', SOLENOID, 8, 10, 1],
  ['BS-2', 'Deli', 'WI-16', 'Deli walk-in freezer', 'freezer', SOLENOID, 8, 8, 1],
];

const toTheHundred = (load) => Math.round(load / 100) * 100;

function* caseCircuits() {
  const numbers = new Map();
  for (const [group, area, tag, description, kind, piping, circuits, more = {}] of CASES) {
    for (const lengths of circuits) {
      const fixtures = lengths.map((length, index) => {
        const number = (numbers.get(tag) ?? 0) + 1;
        numbers.set(tag, number);
        return {
          tag: `${tag}-${String(number).padStart(2, '0')}`,
          description,
          length,
          coils: more.coils?.[index] ?? 1,
        };
      });
      const load = toTheHundred(KINDS[kind].perFoot * lengths.reduce((sum, length) => sum + length, 0));
      const defrost = more.defrost ?? KINDS[kind].defrost;
      const name = `${description}s`.replace(/, 3 doorss$/, 's');
      yield {
        group,
        area,
        name: lengths.length > 1 ? name : description,
        kind,
        piping,
        load,
        defrost,
        type: 'Case',
        fixtures,
      };
    }
  }
}

function* boxCircuits() {
  for (const [group, area, tag, name, kind, piping, width, depth, coils] of BOXES) {
    const { perFoot, defrost } = KINDS[kind];
    const fixtures = [{ tag, description: `${name}, ${width} x ${depth} ft`, length: '', coils }];
    yield {
      group,
      area,
      name,
      kind,
      piping,
      load: toTheHundred(perFoot * width * depth),
      defrost,
      type: 'Walk-in',
      fixtures,
    };
  }
}

function* lines() {
  const circuits = [...caseCircuits(), ...boxCircuits()];
  const counts = { A: 0, B: 0 };
  for (const group of Object.keys(GROUPS)) {
    for (const circuit of circuits.filter((candidate) => candidate.group === group)) {
      const code = `${group[0]}${++counts[group[0]]}`;
      const { tempClass, evaporating, air, band } = KINDS[circuit.kind];
      const { feed, control } = circuit.piping;
      const valve = control === 'Electronic valve' ? 'Electronic' : 'TXV';
      const repeated = [
        ...GROUPS[group],
        code,
        circuit.name,
        circuit.area,
        tempClass,
        feed,
        control,
        circuit.load,
      ];
      for (const { tag, description, length, coils } of circuit.fixtures) {
        const own = [tag, circuit.type, description, length, evaporating, 'Dew', air, ...band, valve, coils];
        yield [...repeated, ...circuit.defrost, ...own];
      }
    }
  }
}

const cell = (value) =>
  /[",]/.test(String(value)) ? `"${String(value).replaceAll('"', '""')}"` : String(value);
const csv = [HEADINGS, ...lines()].map((line) => `${line.map(cell).join(',')}\r\n`).join('');
// With the mark, so that spreadsheet programs take it for UTF-8 and show the degree signs.
writeFileSync(fileURLToPath(new URL('harbor-street-schedule.csv', import.meta.url)), `\uFEFF${csv}`);
