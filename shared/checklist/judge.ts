import { unreachable } from '../failures/unreachable';
import type { SequenceFacts } from './facts';
import { refusedJudgement, type Judgement } from './judgement';
import { chooseRules } from './kinds/choose';
import { confirmRules } from './kinds/confirm';
import { measurementRules } from './kinds/measurement';
import { noteRules } from './kinds/note';
import { overrideRules } from './kinds/override';
import { photoRules } from './kinds/photo';
import { readingRules } from './kinds/reading';
import { signatureRules } from './kinds/signature';
import { superheatRules } from './kinds/superheat';
import { trendRules } from './kinds/trend';
import type { Answer, Step } from './step';

/** Raised by one whenever a change makes an old answer come out otherwise; stored with every judgement. */
export const JUDGING_VERSION = 1;

/**
 * Judges one answer against its step, on the phone while typing and on the server when the entry arrives.
 *
 * @param answer what was recorded; of another kind than the step's it is kept, but doesn't count
 * @returns the outcome with its figures and working; never throws for anything a person can type
 */
export function judge(step: Step, answer: Answer, facts: SequenceFacts): Judgement {
  const judgement = judgeKind(step, answer, facts);
  return changesCircuit(step, answer) ? { ...judgement, changes: true } : judgement;
}

/** Whether the template marks what was recorded as a change of how the circuit runs. */
function changesCircuit(step: Step, answer: Answer): boolean {
  if (step.kind !== answer.kind) return false;
  if (step.kind === 'choose' && answer.kind === 'choose')
    return step.options.some(({ value, changes }) => value === answer.value && changes === true);
  return 'changes' in step && step.changes === true;
}

function judgeKind(step: Step, answer: Answer, facts: SequenceFacts): Judgement {
  switch (step.kind) {
    case 'confirm':
      return answer.kind === step.kind ? confirmRules.judge(step, answer, facts) : mismatch();
    case 'choose':
      return answer.kind === step.kind ? chooseRules.judge(step, answer, facts) : mismatch();
    case 'reading':
      return answer.kind === step.kind ? readingRules.judge(step, answer, facts) : mismatch();
    case 'superheat':
      return answer.kind === step.kind ? superheatRules.judge(step, answer, facts) : mismatch();
    case 'measurement':
      return answer.kind === step.kind ? measurementRules.judge(step, answer, facts) : mismatch();
    case 'trend':
      return answer.kind === step.kind ? trendRules.judge(step, answer, facts) : mismatch();
    case 'photo':
      return answer.kind === step.kind ? photoRules.judge(step, answer, facts) : mismatch();
    case 'note':
      return answer.kind === step.kind ? noteRules.judge(step, answer, facts) : mismatch();
    case 'override':
      return answer.kind === step.kind ? overrideRules.judge(step, answer, facts) : mismatch();
    case 'signature':
      return answer.kind === step.kind ? signatureRules.judge(step, answer, facts) : mismatch();
    default:
      return unreachable(step);
  }
}

function mismatch(): Judgement {
  return refusedJudgement('wrongAnswerKind');
}
