import type { UnitId } from '../units/unit';

/** One figure of a calculation. `label` is a stable key that screens translate, such as `suctionPressure`. */
export interface WorkingLine {
  readonly label: string;
  /** In `unit`, which is an SI unit (Pag, Pa, K, K_diff …); screens convert and round. */
  readonly value: number;
  readonly unit: UnitId;
}

/** How a result was worked out, kept with the entry so that anyone can follow it years later. */
export interface Working {
  /** Stable key of the formula, such as `superheatFromDew`. */
  readonly formula: string;
  /** Where the figures behind the formula come from, as one line of text. */
  readonly source: string;
  /** What went in, what came between, and the result last. */
  readonly lines: readonly WorkingLine[];
}
