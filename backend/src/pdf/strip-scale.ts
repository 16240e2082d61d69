/** What a strip shows, all in one unit. `null` limits are open ends. */
export interface StripFigures {
  readonly value: number;
  readonly low: number | null;
  readonly high: number | null;
  /** Lowest and highest of a hunting valve. */
  readonly hunting: { readonly low: number; readonly high: number } | null;
  readonly asFound: number | null;
}

export interface StripScale {
  readonly from: number;
  readonly to: number;
  readonly ticks: readonly number[];
}

/**
 * The range of a strip: all figures with air around them, so that the channel is in sight and no wedge stands on the
 * edge, and ticks at round steps.
 */
export function stripScale(figures: StripFigures): StripScale {
  const { value, low, high, hunting, asFound } = figures;
  const all = [value, low, high, hunting?.low, hunting?.high, asFound].filter(
    (figure): figure is number => typeof figure === 'number' && Number.isFinite(figure),
  );
  const least = Math.min(...all);
  const most = Math.max(...all);
  const span = Math.max(most - least, Math.abs(most) * 0.05, 1e-6);
  const from = least - span * 0.3;
  const to = most + span * 0.3;
  const step = roundStep((to - from) / 8);
  const ticks: number[] = [];
  for (let tick = Math.ceil(from / step) * step; tick <= to && ticks.length < 40; tick += step)
    ticks.push(tick);
  return { from, to, ticks };
}

function roundStep(rough: number): number {
  const power = 10 ** Math.floor(Math.log10(rough));
  const factor = [1, 2, 5, 10].find((candidate) => candidate * power >= rough) ?? 10;
  return factor * power;
}
