// The closed sets that describe a plant. Values are stored in the database and used as translation keys.

/**
 * What a sequence is for. A system and a suction group have work of their own beside their circuits': pressure test,
 * evacuation, charge, set points, return gas.
 */
export const LEVELS = ['system', 'suctionGroup', 'circuit'] as const;
export type Level = (typeof LEVELS)[number];

export const TEMPERATURE_CLASSES = ['low', 'medium', 'high'] as const;
export type TemperatureClass = (typeof TEMPERATURE_CLASSES)[number];

export const SYSTEM_KINDS = ['rack', 'condensingUnit', 'co2Booster'] as const;
export type SystemKind = (typeof SYSTEM_KINDS)[number];

export const FEEDS = ['homeRun', 'sharedLoop'] as const;
export type Feed = (typeof FEEDS)[number];

export const CONTROLS = [
  'evaporatorPressureRegulator',
  'suctionStop',
  'liquidSolenoid',
  'electronicValve',
] as const;
export type Control = (typeof CONTROLS)[number];

export const DEFROST_TYPES = ['offTime', 'electric', 'hotGas', 'none'] as const;
export type DefrostType = (typeof DEFROST_TYPES)[number];

export const FIXTURE_KINDS = ['case', 'walkIn'] as const;
export type FixtureKind = (typeof FIXTURE_KINDS)[number];

export const VALVE_KINDS = ['thermostatic', 'electronic'] as const;
export type ValveKind = (typeof VALVE_KINDS)[number];

/** Which of a blend's two temperatures a schedule means by "evaporating temperature". */
export const EVAPORATING_BASES = ['dew', 'mean'] as const;
export type EvaporatingBasis = (typeof EVAPORATING_BASES)[number];
