import type { Joint } from '#shared/contracts/openings';
import { unreachable } from '#shared/failures/unreachable';

export type JointState = Joint['state'];
export type JointSize = 'small' | 'medium' | 'large';

/** The drawing of one joint with the two halves of pipe that reach it, in pixels of its own cell. */
export interface JointDrawing {
  readonly width: number;
  readonly height: number;
  readonly pipeWidth: number;
  /** Path of the pipe; for `sentBack` its two ends are offset and don't meet. */
  readonly pipe: string;
  readonly ring: { readonly cx: number; readonly cy: number; readonly r: number } | null;
  /** Path of what is filled: the whole joint, its lower half, or nothing. */
  readonly fill: string;
  /** Path of the two collars of a brazed joint. */
  readonly collar: string;
  readonly collarWidth: number;
  /** Path of the flag that tells submitted from under way. */
  readonly flag: string;
  /** Whether the pipe up to here is drawn as copper: the work has reached it. */
  readonly reached: boolean;
}

const SIZES: Readonly<Record<JointSize, { width: number; height: number; r: number; pipe: number }>> = {
  small: { width: 14, height: 16, r: 3.5, pipe: 2.5 },
  medium: { width: 28, height: 28, r: 6, pipe: 3.5 },
  large: { width: 52, height: 34, r: 8, pipe: 4.5 },
};

/** Works out one joint's drawing from its state alone, so that the line, the marks and the specs agree. */
export function drawJoint(state: JointState, size: JointSize): JointDrawing {
  const { width, height, r, pipe } = SIZES[size];
  const cx = width / 2;
  const cy = height / 2 + (size === 'small' ? 1 : 2);
  const plain = {
    width,
    height,
    pipeWidth: pipe,
    pipe: `M0 ${cy}H${cx - r}M${cx + r} ${cy}H${width}`,
    ring: { cx, cy, r },
    fill: '',
    collar: '',
    collarWidth: size === 'small' ? 1.25 : 2.5,
    flag: '',
    reached: true,
  };
  const half = `M${cx - r} ${cy}A${r} ${r} 0 0 0 ${cx + r} ${cy}Z`;
  switch (state) {
    case 'open':
      return { ...plain, reached: false };
    case 'underWay':
      return { ...plain, fill: half };
    case 'submitted':
      return { ...plain, fill: half, flag: flagAt(cx, cy - r, r) };
    case 'approved':
      return {
        ...plain,
        fill: `M${cx - r} ${cy}A${r} ${r} 0 1 0 ${cx + r} ${cy}A${r} ${r} 0 1 0 ${cx - r} ${cy}Z`,
        collar: collarsAt(cx, cy, r),
      };
    case 'sentBack':
      return { ...plain, ring: null, pipe: brokenPipe(width, cx, cy, r) };
    case 'noSequence':
      return { ...plain, ring: null, pipe: `M0 ${cy}H${cx - r}M${cx + r} ${cy}H${width}`, reached: false };
    default:
      return unreachable(state);
  }
}

function flagAt(cx: number, top: number, r: number): string {
  const mast = top - r * 1.15;
  return `M${cx} ${top}V${mast}L${cx + r} ${mast + r * 0.4}L${cx} ${mast + r * 0.8}`;
}

function collarsAt(cx: number, cy: number, r: number): string {
  const reach = r * 0.72;
  const left = cx - r - 1.5;
  const right = cx + r + 1.5;
  return `M${left} ${cy - reach}V${cy + reach}M${right} ${cy - reach}V${cy + reach}`;
}

function brokenPipe(width: number, cx: number, cy: number, r: number): string {
  const offset = r * 0.65;
  const gap = r * 0.3;
  return `M0 ${cy}H${cx - r}L${cx - gap} ${cy - offset}M${cx + gap} ${cy + offset}L${cx + r} ${cy}H${width}`;
}
