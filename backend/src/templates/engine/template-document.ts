import type { MethodKey } from '#shared/checklist/methods/method-keys';
import type { Caution, Text } from '#shared/checklist/text';
import type { Level } from '#shared/plant/words';
import type { Dimension } from '#shared/units/unit';
import type { CompiledExpression } from './expression';
import type { Scope } from './fact-fields';
import type { Limit } from './limit';
import type { SourceText } from './source-text';

/** A condition with the place where it is written, so that a failing evaluation can point at it. */
export interface Condition {
  readonly expression: CompiledExpression;
  readonly offset: number;
}

/** A limit with its place. */
export interface PlacedLimit {
  readonly limit: Limit;
  readonly offset: number;
}

export interface OptionDocument {
  readonly value: string;
  readonly label: Text;
  readonly outcome: 'within' | 'outside' | 'recorded';
  readonly changes: boolean;
}

/** What only steps of one kind have. */
export type StepBody =
  | { readonly kind: 'confirm'; readonly changes: boolean }
  | { readonly kind: 'choose'; readonly options: readonly OptionDocument[] }
  | {
      readonly kind: 'reading';
      readonly changes: boolean;
      readonly dimension: Dimension;
      readonly low: PlacedLimit | null;
      readonly high: PlacedLimit | null;
    }
  | {
      readonly kind: 'superheat';
      /** `null`: the fixture's own band. */
      readonly band: { readonly low: PlacedLimit; readonly high: PlacedLimit } | null;
      readonly judgedBy: 'midpoint' | 'timeWeighted';
      /** Between a turn of the valve and the reading that counts; `null`: the program's default. */
      readonly wait: PlacedLimit | null;
    }
  | {
      readonly kind: 'measurement';
      readonly changes: boolean;
      readonly method: MethodKey;
      /** By the keys that the method declares. */
      readonly criteria: ReadonlyMap<string, PlacedLimit>;
    }
  | {
      readonly kind: 'trend';
      readonly low: PlacedLimit | null;
      readonly high: PlacedLimit | null;
      readonly hold: PlacedLimit | null;
      readonly longestExcursion: PlacedLimit | null;
    }
  | { readonly kind: 'photo'; readonly minCount: number }
  | { readonly kind: 'note' }
  | { readonly kind: 'override'; readonly subject: Text }
  | { readonly kind: 'signature'; readonly meaning: Text };

/** A step of a checked template. Texts may still hold placeholders. */
export interface StepDocument {
  readonly key: string;
  /** The template's level: there once; otherwise repeated for each fixture or coil of a circuit. */
  readonly scope: Scope;
  readonly when: Condition | null;
  readonly title: Text;
  readonly instruction: Text | null;
  readonly caution: Caution | null;
  readonly required: boolean;
  readonly source: string | null;
  readonly body: StepBody;
  readonly offset: number;
}

export interface SectionDocument {
  readonly key: string;
  readonly title: Text;
  readonly when: Condition | null;
  readonly steps: readonly StepDocument[];
}

/** A template that was read and found sound: every name is known, every type fits, every text stands in both languages. */
export interface TemplateDocument {
  readonly key: string;
  readonly version: number;
  readonly level: Level;
  readonly title: Text;
  readonly applies: Condition;
  readonly priority: number;
  readonly sections: readonly SectionDocument[];
  /** What was read, for messages that point into it. */
  readonly source: SourceText;
}
