import type { Outcome } from '#shared/checklist/judgement';
import { unreachable } from '#shared/failures/unreachable';

export type MarkedOutcome = Outcome | 'waiting';

/** Paths in a 20 × 20 box; `solid` is filled, `stroke` is drawn as a line. */
export interface OutcomeDrawing {
  readonly solid: string;
  readonly stroke: string;
}

/**
 * The shape of an outcome, different for each without any colour: a brazed joint, a wedge that points to the side it
 * lies on (up where there is no side), a dot, a struck ring, half a ring.
 */
export function drawOutcome(outcome: MarkedOutcome, side: 'low' | 'high' | null): OutcomeDrawing {
  switch (outcome) {
    case 'within':
      return { solid: circle(10, 10, 5), stroke: 'M0 10H5M15 10H20M3.5 6V14M16.5 6V14' };
    case 'outside':
      return { solid: wedge(side), stroke: '' };
    case 'recorded':
      return { solid: circle(10, 10, 4), stroke: '' };
    case 'notApplicable':
      return { solid: '', stroke: `${circle(10, 10, 6)}M4 16L16 4` };
    case 'waiting':
      return { solid: '', stroke: 'M10 4A6 6 0 0 0 10 16' };
    default:
      return unreachable(outcome);
  }
}

function wedge(side: 'low' | 'high' | null): string {
  if (side === 'low') return 'M1 10L17 3V17Z';
  return side === 'high' ? 'M19 10L3 3V17Z' : 'M10 2L18 17H2Z';
}

function circle(cx: number, cy: number, r: number): string {
  return `M${cx - r} ${cy}a${r} ${r} 0 1 0 ${2 * r} 0a${r} ${r} 0 1 0 ${-2 * r} 0`;
}
