/** Fields of the specification as expressions see them, by type name; the order matters: a type before its user. */
export const FACT_FIELDS = {
  Opening: { name: 'string', elevationM: 'Length', unitSystem: 'string' },
  System: { name: 'string', kind: 'string', refrigerant: 'string', safetyClass: 'string' },
  SuctionGroup: { name: 'string', temperatureClass: 'string', saturatedSuctionTemperatureK: 'Temperature' },
  Coil: { number: 'int' },
  Fixture: {
    tag: 'string',
    description: 'string',
    kind: 'string',
    hasLength: 'bool',
    lengthM: 'Length',
    evaporatingTemperatureK: 'Temperature',
    evaporatingBasis: 'string',
    dischargeAirTemperatureK: 'Temperature',
    superheatLowK: 'TemperatureDifference',
    superheatHighK: 'TemperatureDifference',
    valveKind: 'string',
    coils: 'list<Coil>',
  },
  Defrost: {
    type: 'string',
    perDay: 'int',
    hasFailSafe: 'bool',
    failSafeS: 'Duration',
    hasTerminationTemperature: 'bool',
    terminationTemperatureK: 'Temperature',
    hasDrip: 'bool',
    dripS: 'Duration',
  },
  Circuit: {
    code: 'string',
    description: 'string',
    area: 'string',
    temperatureClass: 'string',
    feed: 'string',
    control: 'string',
    evaporatingTemperatureK: 'Temperature',
    evaporatingBasis: 'string',
    hasLoad: 'bool',
    loadW: 'HeatFlow',
    defrost: 'Defrost',
    fixtures: 'list<Fixture>',
    hasWalkIn: 'bool',
    hasElectronicValve: 'bool',
  },
} as const;

/** What the schedule may leave out, and the fact that says whether it did: an expression must ask before it reads. */
export const GUARDS: Readonly<Record<string, string>> = {
  lengthM: 'hasLength',
  failSafeS: 'hasFailSafe',
  terminationTemperatureK: 'hasTerminationTemperature',
  dripS: 'hasDrip',
  loadW: 'hasLoad',
};

/** Where a step stands: there once, at the template's level, or repeated for each fixture or coil of a circuit. */
export const SCOPES = ['system', 'suctionGroup', 'circuit', 'fixture', 'coil'] as const;
export type Scope = (typeof SCOPES)[number];

const GROUP_NAMES = ['opening', 'system', 'suctionGroup'] as const;
const CIRCUIT_NAMES = [...GROUP_NAMES, 'circuit'] as const;

/** The names that expressions and placeholders may begin with. */
export const NAMES: Readonly<Record<Scope, readonly string[]>> = {
  system: ['opening', 'system'],
  suctionGroup: GROUP_NAMES,
  circuit: CIRCUIT_NAMES,
  fixture: [...CIRCUIT_NAMES, 'fixture'],
  coil: [...CIRCUIT_NAMES, 'fixture', 'coil'],
};
