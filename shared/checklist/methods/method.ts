import type { Dimension } from '../../units/unit';
import type { SequenceFacts } from '../facts';
import type { Judgement } from '../judgement';
import type { Text } from '../text';

/** One box of a method's form: a quantity with its dimension, one of a few named words, or free words. */
export type MethodField =
  | {
      readonly kind: 'quantity';
      readonly key: string;
      readonly label: Text;
      readonly dimension: Dimension;
      readonly required: boolean;
      /** Whether the value may lie below zero, so that the box offers a sign. */
      readonly signed?: boolean;
    }
  | {
      readonly kind: 'choice';
      readonly key: string;
      readonly label: Text;
      readonly required: boolean;
      readonly options: readonly { readonly value: string; readonly label: Text }[];
    }
  | { readonly kind: 'words'; readonly key: string; readonly label: Text; readonly required: boolean };

/** One number that a template gives the method, in the SI unit of its dimension. */
export interface MethodCriterion {
  readonly key: string;
  readonly label: Text;
  readonly dimension: Dimension;
  /** A criterion that isn't required may be left out; the method then judges without it, or uses its own documented value. */
  readonly required: boolean;
}

/** What was typed, read: quantities in SI, words as they are. `null` where a box that isn't required was left empty. */
type FieldValues<F extends readonly MethodField[]> = {
  readonly [E in F[number] as E['key']]: E extends { readonly kind: 'quantity' }
    ? E extends { readonly required: true }
      ? number
      : number | null
    : E extends { readonly kind: 'choice'; readonly options: readonly { readonly value: infer V }[] }
      ? E extends { readonly required: true }
        ? V
        : V | null
      : E extends { readonly required: true }
        ? string
        : string | null;
};

type CriterionValues<C extends readonly MethodCriterion[]> = {
  readonly [E in C[number] as E['key']]: E extends { readonly required: true } ? number : number | null;
};

export interface MethodInput<
  F extends readonly MethodField[],
  R extends readonly MethodField[],
  C extends readonly MethodCriterion[],
> {
  readonly values: FieldValues<F>;
  /** In the order in which they were typed. */
  readonly rows: readonly FieldValues<R>[];
  readonly criteria: CriterionValues<C>;
  readonly facts: SequenceFacts;
  /** Where the criterion comes from, as the template says it. */
  readonly source: string;
}

export interface MethodDefinition<
  F extends readonly MethodField[],
  R extends readonly MethodField[],
  C extends readonly MethodCriterion[],
> {
  readonly title: Text;
  readonly fields: F;
  /** Boxes that repeat, such as the cylinders of a charge; `null` for a method without. */
  readonly rows: {
    readonly label: Text;
    readonly fields: R;
    readonly least: number;
    readonly most: number;
  } | null;
  readonly criteria: C;
  /**
   * Whether a part may be recorded now and the rest hours later, as with a test that is left standing overnight. What
   * is recorded first is kept, and doesn't count yet.
   */
  readonly inTwoVisits: boolean;
  judge(input: MethodInput<F, R, C>): Judgement;
}

/** A method as the checklist, the screens and the package see it, without the types of its own boxes. */
export interface Method {
  readonly title: Text;
  readonly fields: readonly MethodField[];
  readonly rows: {
    readonly label: Text;
    readonly fields: readonly MethodField[];
    readonly least: number;
    readonly most: number;
  } | null;
  readonly criteria: readonly MethodCriterion[];
  readonly inTwoVisits: boolean;
  judge(input: {
    readonly values: Readonly<Record<string, number | string | null>>;
    readonly rows: readonly Readonly<Record<string, number | string | null>>[];
    readonly criteria: Readonly<Record<string, number | null>>;
    readonly facts: SequenceFacts;
    readonly source: string;
  }): Judgement;
}

/**
 * Declares a method: its boxes, what a template gives it, and how it judges. The boxes' keys and kinds type the input of
 * `judge`; who calls it (`judgeMeasurement`) has read every box by these same declarations.
 */
export function defineMethod<
  const F extends readonly MethodField[],
  const R extends readonly MethodField[],
  const C extends readonly MethodCriterion[],
>(definition: MethodDefinition<F, R, C>): Method {
  return definition as unknown as Method;
}

/** A quantity's box. */
export const quantity = <const K extends string, const D extends Dimension>(
  key: K,
  dimension: D,
  en: string,
  es: string,
) => ({ kind: 'quantity', key, label: { en, es }, dimension, required: true }) as const;

/** A quantity's box that may stay empty. */
export const quantityIfKnown = <const K extends string, const D extends Dimension>(
  key: K,
  dimension: D,
  en: string,
  es: string,
) => ({ kind: 'quantity', key, label: { en, es }, dimension, required: false }) as const;

/** A criterion that every step of the method has to give. */
export const criterion = <const K extends string, const D extends Dimension>(
  key: K,
  dimension: D,
  en: string,
  es: string,
) => ({ key, label: { en, es }, dimension, required: true }) as const;

/** A criterion that a step may leave out. */
export const criterionIfAny = <const K extends string, const D extends Dimension>(
  key: K,
  dimension: D,
  en: string,
  es: string,
) => ({ key, label: { en, es }, dimension, required: false }) as const;
