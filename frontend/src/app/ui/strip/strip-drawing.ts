/** What a strip shows, all in the same SI unit. `minimum` and `maximum` only for a hunting valve. */
export interface StripValues {
  readonly low: number | null;
  readonly high: number | null;
  readonly value: number;
  readonly minimum: number | null;
  readonly maximum: number | null;
  /** Half width of the instruments' error around the value, where it is known. */
  readonly uncertainty?: number | null;
}

/** Positions along the bar as fractions: 0 is its left end, 1 its right end. */
export interface StripDrawing {
  /** The channel; it runs to the bar's end on a side without a limit. `null` when there is no limit at all. */
  readonly channel: { readonly from: number; readonly to: number } | null;
  readonly low: number | null;
  readonly high: number | null;
  readonly value: number;
  readonly bracket: { readonly from: number; readonly to: number } | null;
  /** The instruments' error around the value. */
  readonly whisker: { readonly from: number; readonly to: number } | null;
  /** The way still to go, from the value to the nearer edge. `null` when it lies within, or nothing is wanted. */
  readonly way: { readonly from: number; readonly to: number; readonly direction: 'up' | 'down' } | null;
  /** Whether the channel is too narrow for both limits' labels under its edges; they then stand outside it. */
  readonly isNarrow: boolean;
  /** Ruled lines of the bar. */
  readonly ticks: readonly number[];
}

const MARGIN = 0.12;
const NARROW = 0.36;
const TICKS = [0, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 1] as const;
/** The same slack as judging has, so that a value on the edge shows no way to go. */
const EDGE = 1e-9;

/**
 * Lays a value and its limits out on a bar. The channel takes about the middle half of the bar; the scale stretches so
 * far that nothing falls off, and is never of zero width.
 */
export function drawStrip(values: StripValues): StripDrawing {
  const { from, to } = scaleOf(values);
  const place = (si: number): number => (si - from) / (to - from);
  const { low, high, value, minimum, maximum } = values;
  const error = errorOf(values);
  const slack = EDGE * Math.max(1, Math.abs(value));
  const edge =
    low !== null && value < low - slack ? low : high !== null && value > high + slack ? high : null;
  return {
    channel:
      low === null && high === null
        ? null
        : { from: low === null ? 0 : place(low), to: high === null ? 1 : place(high) },
    low: low === null ? null : place(low),
    high: high === null ? null : place(high),
    value: place(value),
    bracket: minimum === null || maximum === null ? null : { from: place(minimum), to: place(maximum) },
    whisker: error === 0 ? null : { from: place(value - error), to: place(value + error) },
    way:
      edge === null ? null : { from: place(value), to: place(edge), direction: edge > value ? 'up' : 'down' },
    isNarrow: low !== null && high !== null && place(high) - place(low) < NARROW,
    ticks: TICKS,
  };
}

const errorOf = ({ uncertainty }: StripValues): number =>
  uncertainty && Number.isFinite(uncertainty) && uncertainty > 0 ? uncertainty : 0;

function scaleOf(values: StripValues): { from: number; to: number } {
  const { low, high, value, minimum, maximum } = values;
  const error = errorOf(values);
  const shown = [low, high, value - error, value + error, minimum, maximum].filter(
    (si): si is number => si !== null && Number.isFinite(si),
  );
  const least = Math.min(...shown);
  const most = Math.max(...shown);
  const band = low !== null && high !== null ? Math.abs(high - low) : 0;
  const spread = Math.max(most - least, band) || Math.max(1, Math.abs(most) * 0.05);
  let from = least - spread * MARGIN;
  let to = most + spread * MARGIN;
  if (low !== null) from = Math.min(from, low - spread * 0.4);
  if (high !== null) to = Math.max(to, high + spread * 0.4);
  if (low === null && high !== null) from = Math.min(from, high - spread);
  if (high === null && low !== null) to = Math.max(to, low + spread);
  return { from, to };
}
