/** The methods that a measurement can be worked out by; each is one file beside this one. */
export const METHOD_KEYS = [
  'pressureTest',
  'evacuation',
  'supplyVoltage',
  'heaterCurrent',
  'returnGas',
  'subcooling',
  'regulatorPressure',
  'witnessedDefrost',
  'refrigerantCharge',
  'electronicValve',
] as const;
export type MethodKey = (typeof METHOD_KEYS)[number];
