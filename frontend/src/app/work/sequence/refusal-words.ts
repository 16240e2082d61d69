import { ENTRY_REFUSALS } from '#shared/contracts/sequences';
import { FAILURE_CODES } from '#shared/failures/failure';
import type { KeptRefusal } from '../../offline/local-database';

/** A translation key and its parameters. */
export interface Words {
  readonly key: string;
  readonly params: Readonly<Record<string, string>>;
}

const REFUSALS: readonly string[] = ENTRY_REFUSALS;
const FAILURES: readonly string[] = FAILURE_CODES;

/** Which words say why something was not taken. What an earlier version kept as a sentence has no code: `unknown`. */
export function refusalWords(reason: KeptRefusal): Words {
  if (reason === null || typeof reason === 'string') return { key: 'work.refusal_unknown', params: {} };
  if (reason.code === 'callRefused') {
    const { failure } = reason.params;
    return { key: `ui.failure_${FAILURES.includes(failure) ? failure : 'unknown'}`, params: {} };
  }
  const { path } = reason.params;
  if (reason.code === 'notAnEntry' && path !== undefined)
    return { key: 'work.refusal_notAnEntryAt', params: { path: path } };
  return { key: `work.refusal_${REFUSALS.includes(reason.code) ? reason.code : 'unknown'}`, params: {} };
}
