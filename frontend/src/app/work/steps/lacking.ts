/** What an answer in the making lacks: the end of a key of the words. */
export const LACKINGS = [
  'reading',
  'log',
  'logInFuture',
  'choice',
  'photo',
  'words',
  'signature',
  'asLeft',
  'asLeftPressure',
  'asLeftTemperature',
  'asFoundPressure',
  'asFoundTemperature',
  'seriesTime',
  'lineDrop',
] as const;
export type Lacking = (typeof LACKINGS)[number];
