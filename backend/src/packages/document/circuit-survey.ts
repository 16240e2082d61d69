import type { SequenceDetail } from '#shared/contracts/sequences';
import type { SequenceId } from '#shared/plant/ids';
import type { CircuitSource } from './circuit-source';
import type { PackageCircuitRef } from './package-content';

/** What the document has to know of a circuit before it is laid out. */
export interface CircuitSurvey {
  /** Whether anything was recorded on its steps: only then it gets a chapter. */
  readonly isBegun: boolean;
  readonly stepCount: number;
}

export type Survey = ReadonlyMap<SequenceId, CircuitSurvey>;

/** Whether somebody answered a step or called it not applicable, counted or not: that is never left out. */
export function hasRecording(detail: Pick<SequenceDetail, 'entries'>): boolean {
  return detail.entries.some(
    ({ body }) => body.content.kind === 'answer' || body.content.kind === 'notApplicable',
  );
}

/** Looks through all circuits once, one in memory at a time, to learn which of them get a chapter. */
export async function surveyCircuits(
  circuits: readonly PackageCircuitRef[],
  source: Pick<CircuitSource, 'load'>,
): Promise<Survey> {
  const survey = new Map<SequenceId, CircuitSurvey>();
  for (const { sequenceId } of circuits) {
    const detail = await source.load(sequenceId);
    survey.set(sequenceId, { isBegun: hasRecording(detail), stepCount: detail.stepList.steps.length });
  }
  return survey;
}
