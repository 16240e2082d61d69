import { inject, Injectable, signal } from '@angular/core';
import type { ReviewRequest } from '#shared/contracts/sequences';
import type { SequenceId } from '#shared/plant/ids';
import { PasswordAgain } from '../session/password-again';
import { withPassword } from '../ui/pages/with-password';
import { problemCodeOf } from '../ui/problem-of';
import { ReviewsApi } from './reviews-api';

/** `changed`: somebody recorded or reviewed meanwhile, and it has to be looked at anew. */
export type VerdictResult = 'given' | 'changed' | 'notGiven';

/** Sends one verdict at a time, asks for the password where the server wants it, and keeps what went wrong. */
@Injectable()
export class VerdictSender {
  private readonly api = inject(ReviewsApi);
  private readonly passwordAgain = inject(PasswordAgain);
  private readonly sending = signal(false);
  private readonly failure = signal<unknown>(null);

  readonly isSending = this.sending.asReadonly();
  readonly problem = this.failure.asReadonly();

  async send(sequenceId: SequenceId, request: ReviewRequest): Promise<VerdictResult> {
    if (this.sending()) return 'notGiven';
    this.sending.set(true);
    this.failure.set(null);
    try {
      await withPassword(
        () => this.api.review(sequenceId, request),
        () => this.passwordAgain.ask(),
      );
      return 'given';
    } catch (error) {
      this.failure.set(error);
      const code = problemCodeOf(error);
      return code === 'changedMeanwhile' || code === 'wrongState' ? 'changed' : 'notGiven';
    } finally {
      this.sending.set(false);
    }
  }

  /** Forgets what went wrong, once the person turned to something else. */
  clear(): void {
    this.failure.set(null);
  }
}
