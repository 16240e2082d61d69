import type { SequenceFacts } from '#shared/checklist/facts';
import { judge } from '#shared/checklist/judge';
import type { Judgement } from '#shared/checklist/judgement';
import type { SuperheatStep } from '#shared/checklist/kinds/superheat';
import { howRead, observationOf, pairOf, type ReadHow } from './superheat-answer';
import { NO_INSTRUMENTS, type TypedObservation, type TypedPair } from './superheat-typed';

/** What one pair gives while it is typed; `null` where there is no saturation at that pressure. */
export interface LivePair {
  readonly saturationK: number | null;
  readonly superheatK: number | null;
}

/** A vented gauge at the coil's outlet, of unknown accuracy. */
const PLAINLY: ReadHow = { takenAt: 'coilOutlet', lineDrop: '', instruments: NO_INSTRUMENTS };

/** Saturation and superheat of one pair, worked out as the server will. */
export function livePair(
  typed: TypedPair,
  step: SuperheatStep,
  facts: SequenceFacts,
  how: ReadHow = PLAINLY,
): LivePair {
  const pair = pairOf(typed, facts.unitSystem);
  if (!pair) return { saturationK: null, superheatK: null };
  const judgement = judge(
    step,
    {
      kind: 'superheat',
      asFound: null,
      asLeft: { valve: 'steady', pair },
      ...howRead(how, facts.unitSystem),
    },
    facts,
  );
  return { saturationK: figureOf(judgement, 'saturation'), superheatK: figureOf(judgement, 'superheat') };
}

/** The judgement of one observation by itself; `null` while it isn't complete. */
export function liveObservation(
  typed: TypedObservation,
  step: SuperheatStep,
  facts: SequenceFacts,
  how: ReadHow = PLAINLY,
): Judgement | null {
  const observation = observationOf(typed, facts.unitSystem);
  return (
    observation &&
    judge(
      step,
      { kind: 'superheat', asFound: null, asLeft: observation, ...howRead(how, facts.unitSystem) },
      facts,
    )
  );
}

/** A figure of a judgement in SI; `null` where it has none of the label. */
export function figureOf(judgement: Judgement | null, label: string): number | null {
  return judgement?.figures.find((candidate) => candidate.label === label)?.value ?? null;
}
