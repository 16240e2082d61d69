import type { UnitId } from '../units/unit';
import type { SequenceFacts } from './facts';
import type { SuperheatAnswer, SuperheatPair } from './kinds/superheat';
import type { Signature } from './signature';
import type { StepKind, StepOf } from './step';

// Steps, answers and facts that show only what a spec is about.

export const SEA_LEVEL: SequenceFacts = {
  refrigerant: 'R-448A',
  atmospherePaAbs: 101_325,
  elevationM: 0,
  unitSystem: 'us',
};

const text = { en: 'Words', es: 'Palabras' };

const BASE = {
  key: 'a.step',
  section: 'a',
  title: text,
  instruction: null,
  caution: null,
  fixtureId: null,
  coilId: null,
  required: true,
  source: 'the specification',
};

const STEPS: { readonly [K in StepKind]: StepOf<K> } = {
  confirm: { kind: 'confirm', ...BASE },
  choose: {
    kind: 'choose',
    ...BASE,
    options: [
      { value: 'clear', label: text, outcome: 'within' },
      { value: 'bubbles', label: text, outcome: 'outside' },
      { value: 'noGlass', label: text, outcome: 'recorded' },
    ],
  },
  reading: {
    kind: 'reading',
    ...BASE,
    dimension: 'temperature',
    limits: { low: null, high: null },
    siUnit: 'K',
  },
  superheat: { kind: 'superheat', ...BASE, band: { lowK: 0, highK: 0 } },
  measurement: { kind: 'measurement', ...BASE, method: 'subcooling', criteria: {} },
  trend: { kind: 'trend', ...BASE, bandLowK: null, bandHighK: 278.15, holdS: 86_400, longestExcursionS: 0 },
  photo: { kind: 'photo', ...BASE, minCount: 1 },
  note: { kind: 'note', ...BASE },
  override: { kind: 'override', ...BASE, subject: text },
  signature: { kind: 'signature', ...BASE, meaning: text },
};

/** A step of the kind, with what the spec changes. */
export function buildStep<K extends StepKind>(kind: K, change: Partial<StepOf<K>> = {}): StepOf<K> {
  return { ...STEPS[kind], ...change };
}

/** Fahrenheit degrees of difference in kelvin, written out here so that a spec doesn't trust what it tests. */
export const fahrenheitDegrees = (value: number): number => (value * 5) / 9;

/** A Fahrenheit temperature in kelvin, likewise. */
export const fahrenheitInKelvin = (value: number): number => ((value + 459.67) * 5) / 9;

export const pair = (
  pressure: string,
  temperature: string,
  units: { readonly pressure?: UnitId; readonly temperature?: UnitId } = {},
): SuperheatPair => ({
  pressure: { text: pressure, unit: units.pressure ?? 'psig' },
  temperature: { text: temperature, unit: units.temperature ?? 'degF' },
});

export const steady = (asLeft: SuperheatPair, asFound: SuperheatPair | null = null): SuperheatAnswer => ({
  kind: 'superheat',
  asFound: asFound && { valve: 'steady', pair: asFound },
  asLeft: { valve: 'steady', pair: asLeft },
});

export const hunting = (low: SuperheatPair, high: SuperheatPair): SuperheatAnswer => ({
  kind: 'superheat',
  asFound: null,
  asLeft: { valve: 'hunting', low, high },
});

export function buildSignature(change: Partial<Signature> = {}): Signature {
  return {
    printedName: 'R. Quill',
    width: 300,
    height: 100,
    strokes: [[10, 10, 20, 30]],
    typed: false,
    ...change,
  };
}
