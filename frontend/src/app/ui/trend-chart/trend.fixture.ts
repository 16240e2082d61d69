import type { TrendAnswer, TrendStep } from '#shared/checklist/kinds/trend';

const HOUR_S = 3600;

/** Down to 41 °F or less, held for a day. */
export const TREND_STEP: TrendStep = {
  kind: 'trend',
  key: 'pull-down',
  section: 'one',
  title: { en: 'Pull-down of the box', es: 'Abatimiento de la cámara' },
  instruction: null,
  caution: null,
  fixtureId: null,
  coilId: null,
  required: true,
  source: null,
  bandLowK: null,
  bandHighK: 278.15,
  holdS: 24 * HOUR_S,
  longestExcursionS: 1800,
};

/** A log with a sample every ten minutes. */
export function trendAnswer(hours: number, temperatureK: (atH: number) => number): TrendAnswer {
  const atS = Array.from({ length: hours * 6 + 1 }, (_, index) => index * 600);
  return {
    kind: 'trend',
    file: { name: 'box 7.csv', sha256: 'a'.repeat(64), rows: atS.length },
    startText: '2026-11-30 06:00',
    column: 'Air (°F)',
    atS,
    temperatureK: atS.map((at) => temperatureK(at / HOUR_S)),
  };
}

/** From 298.15 K down to 273.15 K in five hours, there for good, but for half an hour at 281.15 K after ten. */
export const PULL_DOWN = trendAnswer(36, (atH) => {
  if (atH === 10) return 281.15;
  return atH < 5 ? 298.15 - 5 * atH : 273.15;
});
