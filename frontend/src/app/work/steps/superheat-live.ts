import type { SequenceFacts } from '#shared/checklist/facts';
import { judge } from '#shared/checklist/judge';
import type { Judgement } from '#shared/checklist/judgement';
import type { SuperheatStep } from '#shared/checklist/kinds/superheat';
import type { UnitSystem } from '#shared/units/unit-system';
import { observationOf, pairOf, type TypedObservation, type TypedPair } from './superheat-typed';

/** What one pair gives while it is typed; `null` where there is no saturation at that pressure. */
export interface LivePair {
  readonly saturationK: number | null;
  readonly superheatK: number | null;
}

/** Saturation and superheat of one pair, worked out as the server will. */
export function livePair(typed: TypedPair, step: SuperheatStep, facts: SequenceFacts): LivePair {
  const pair = pairOf(typed, facts.unitSystem);
  if (!pair) return { saturationK: null, superheatK: null };
  const judgement = judge(
    step,
    { kind: 'superheat', asFound: null, asLeft: { valve: 'steady', pair } },
    facts,
  );
  return { saturationK: figure(judgement, 'saturation'), superheatK: figure(judgement, 'superheat') };
}

/** The judgement of one observation by itself; `null` while it isn't complete. */
export function liveObservation(
  typed: TypedObservation,
  step: SuperheatStep,
  facts: SequenceFacts,
  system: UnitSystem,
): Judgement | null {
  const observation = observationOf(typed, system);
  return observation && judge(step, { kind: 'superheat', asFound: null, asLeft: observation }, facts);
}

function figure(judgement: Judgement, label: string): number | null {
  return judgement.figures.find((candidate) => candidate.label === label)?.value ?? null;
}
