import type {
  Control,
  DefrostType,
  EvaporatingBasis,
  Feed,
  FixtureKind,
  SystemKind,
  TemperatureClass,
  ValveKind,
} from '#shared/plant/words';

/** How each member of a closed set is written in schedules, after `bare`; the first spelling is shown in problems. */
export type Spellings<Word extends string> = Readonly<
  Record<Word, readonly [shown: string, ...others: string[]]>
>;

/** @returns the letters and digits only, in lower case: how headings and words are compared */
export const bare = (text: string): string => text.toLowerCase().replace(/[^\p{L}\p{N}]/gu, '');

export const TEMPERATURE_CLASS_WORDS: Spellings<TemperatureClass> = {
  low: ['low', 'lt', 'l', 'low temp', 'low temperature', 'frozen'],
  medium: ['medium', 'mt', 'm', 'med', 'medium temp', 'med temp', 'medium temperature'],
  high: ['high', 'ht', 'h', 'high temp', 'high temperature'],
};

export const SYSTEM_KIND_WORDS: Spellings<SystemKind> = {
  rack: ['rack', 'parallel rack', 'compressor rack'],
  condensingUnit: ['condensing unit', 'cu'],
  co2Booster: ['CO2 booster', 'booster', 'transcritical booster', 'CO2 transcritical booster'],
};

export const FEED_WORDS: Spellings<Feed> = {
  homeRun: ['home run', 'home run piping', 'home-run line', 'individual line'],
  sharedLoop: ['shared loop', 'loop', 'loop piping', 'loop piped', 'looped'],
};

export const CONTROL_WORDS: Spellings<Control> = {
  evaporatorPressureRegulator: ['EPR', 'evaporator pressure regulator', 'EEPR', 'electronic EPR'],
  suctionStop: ['suction stop', 'suction stop valve', 'suction solenoid'],
  liquidSolenoid: [
    'liquid solenoid',
    'liquid line solenoid',
    'LLS',
    'liquid solenoid pump-down',
    'pump-down',
  ],
  electronicValve: ['electronic valve', 'electronic valves', 'EEV', 'EXV', 'electronic expansion valve'],
};

export const DEFROST_TYPE_WORDS: Spellings<DefrostType> = {
  offTime: ['off-time', 'off-cycle', 'off', 'time off', 'air', 'OT'],
  electric: ['electric', 'elec', 'electrical', 'EL'],
  hotGas: ['hot gas', 'HG', 'gas'],
  none: ['none', 'no', 'no defrost'],
};

export const FIXTURE_KIND_WORDS: Spellings<FixtureKind> = {
  case: ['case', 'display case', 'refrigerated case'],
  walkIn: ['walk-in', 'walk-in box', 'walk-in cooler', 'walk-in freezer', 'box'],
};

export const VALVE_KIND_WORDS: Spellings<ValveKind> = {
  thermostatic: ['thermostatic', 'TXV', 'TEV', 'thermostatic expansion valve', 'mechanical'],
  electronic: ['electronic', 'EEV', 'EXV', 'electronic expansion valve'],
};

export const EVAPORATING_BASIS_WORDS: Spellings<EvaporatingBasis> = {
  dew: ['dew', 'dew point'],
  mean: ['mean', 'mid-point', 'average'],
};
