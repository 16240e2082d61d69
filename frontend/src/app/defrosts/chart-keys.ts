import type { CircuitId } from '#shared/plant/ids';
import { secondsApart } from '#shared/refrigeration/defrost/day-circle';
import type { ChartRow } from './chart-rows';
import type { ChosenStart } from './plan-draft';

export const SMALL_STEP_S = 300;
export const LARGE_STEP_S = 1800;

/** By how many seconds a key moves a defrost; `null` for a key that doesn't. */
export function stepOfKey({ key, shiftKey }: Pick<KeyboardEvent, 'key' | 'shiftKey'>): number | null {
  const stepS = shiftKey ? LARGE_STEP_S : SMALL_STEP_S;
  if (key === 'ArrowRight') return stepS;
  return key === 'ArrowLeft' ? -stepS : null;
}

/**
 * Where a key leads from one defrost: up and down to the nearest of another circuit, Page Up and Page Down to the
 * circuit's own one before or after. `null` where it leads nowhere.
 */
export function neighbourOf(
  key: string,
  rows: readonly ChartRow[],
  circuitId: CircuitId,
  startS: number,
): ChosenStart | null {
  const filled = rows.filter(({ circuit, bars }) => bars.length > 0 || circuit.id === circuitId);
  const at = filled.findIndex(({ circuit }) => circuit.id === circuitId);
  if (key === 'ArrowUp' || key === 'ArrowDown') {
    const other = filled[at + (key === 'ArrowUp' ? -1 : 1)];
    const [nearest] = [...(other?.bars ?? [])].sort(
      (a, b) => secondsApart(a.startS, startS) - secondsApart(b.startS, startS),
    );
    return other && nearest ? { circuitId: other.circuit.id, startS: nearest.startS } : null;
  }
  if (key !== 'PageUp' && key !== 'PageDown') return null;
  const bars = filled[at]?.bars ?? [];
  const index = bars.findIndex((bar) => bar.startS === startS) + (key === 'PageUp' ? -1 : 1);
  const own = bars.at(index % Math.max(1, bars.length));
  return own ? { circuitId, startS: own.startS } : null;
}
