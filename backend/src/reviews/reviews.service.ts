import { uuidv7 } from 'uuidv7';
import type { Step } from '#shared/checklist/step';
import { isSignedBy, type Signature } from '#shared/checklist/signature';
import type { ReviewRequest } from '#shared/contracts/sequences';
import { DomainFailure } from '#shared/failures/failure';
import type { CompanyId, EntryId, SequenceId } from '#shared/plant/ids';
import { canonicalJson } from '#shared/sequences/canonical-json';
import { bodyHash } from '#shared/sequences/chain';
import type { EntryBody, EntryContent } from '#shared/sequences/entry';
import { missingSteps } from '#shared/sequences/fold';
import type { FoldState } from '#shared/sequences/fold-state';
import { transitionFor, type SequenceState } from '#shared/sequences/transitions';
import type { AuditService } from '../audit/audit.service';
import type { Context, Transactions } from '../database/transactions';
import type { LiveEventsService } from '../events/live-events.service';
import type { Caller } from '../http/define-route';
import { requireFreshPassword } from '../http/password-age';
import type { LockedForReview, SequenceReviewDesk } from '../sequences/sequence-review-desk.service';
import type { InstallationKey } from '../signing/installation-key';
import type { ReviewsRepository } from './reviews.repository';
import type { SentBackExpansion } from './sent-back-expansion.service';
import type { SentBackNotice } from './sent-back-notice.service';

/** What an approval says under the name; printed with the signature (21 CFR 11.50(a)(3)). */
export const APPROVAL_MEANING = { en: 'Reviewed and approved', es: 'Revisado y aprobado' } as const;

/** A lead's verdict on a submitted sequence. */
export class ReviewsService {
  constructor(
    private readonly transactions: Transactions,
    private readonly desk: SequenceReviewDesk,
    private readonly reviews: ReviewsRepository,
    private readonly key: InstallationKey,
    private readonly audit: AuditService,
    private readonly events: LiveEventsService,
    private readonly notice: SentBackNotice,
    private readonly reasked: SentBackExpansion,
  ) {}

  /**
   * Approves the head that the lead looked at, or sends named steps back.
   *
   * @throws {DomainFailure} wrongState: not submitted; changedMeanwhile: something arrived since the lead looked;
   *   fourEyes: the lead recorded some of it; passwordNeeded; invalidInput: a remark on a step that isn't there
   */
  async give(
    caller: Caller,
    id: SequenceId,
    request: ReviewRequest,
  ): Promise<{ state: SequenceState; headHash: string }> {
    if (request.verdict === 'approved') {
      requireFreshPassword(caller);
      checkSignature(request.signature, caller.personName);
    }
    return this.transactions.run(async (context) => {
      const locked = await this.desk.lock(context, id);
      checkVerdict(locked.fold, locked.steps, request, caller);
      if (request.verdict === 'approved') await this.checkEvidence(context, locked);
      const body = this.bodyOf(caller, id, locked.stepListHash, request);
      const after = await this.desk.append(context, locked, body, bodyHash(body));
      await this.reviews.insert(context, {
        ...this.signedReview(caller, locked, request, body, after.headHash),
        id: uuidv7(),
        companyId: locked.companyId,
        sequenceId: id,
        createdAt: new Date(),
      });
      await this.tell(context, caller, locked, request, after);
      return { state: after.state, headHash: after.headHash };
    });
  }

  /** What was submitted may have come apart since: an override set, a reading corrected into one that doesn't count. */
  private async checkEvidence(context: Context, locked: LockedForReview): Promise<void> {
    const missing = missingSteps(locked.fold, locked.steps).map((step) => step.key);
    if (missing.length > 0) {
      throw new DomainFailure(
        'wrongState',
        'Some steps lack an answer that counts, or something stands by hand.',
        [],
        {
          missing,
        },
      );
    }
    const awaitedPhotos = await this.desk.countAwaitedPhotos(context, locked);
    if (awaitedPhotos > 0) {
      throw new DomainFailure(
        'wrongState',
        'Photos that count as evidence have not arrived, or can not be opened.',
        [],
        {
          awaitedPhotos,
        },
      );
    }
  }

  private bodyOf(
    caller: Caller,
    sequenceId: SequenceId,
    stepListHash: string,
    request: ReviewRequest,
  ): EntryBody {
    const content: EntryContent = {
      kind: 'review',
      verdict: request.verdict,
      headHash: request.headHash,
      remarks: request.verdict === 'sentBack' ? request.remarks : [],
      signature:
        request.verdict === 'approved' ? { ...request.signature, printedName: caller.personName } : null,
      meaning: request.verdict === 'approved' ? APPROVAL_MEANING : null,
    };
    return {
      format: 1,
      id: uuidv7() as EntryId,
      sequenceId,
      authorId: caller.person.id,
      deviceId: null,
      deviceCount: 0,
      countOnSequence: 0,
      deviceTime: new Date().toISOString(),
      stepListHash,
      supersedes: null,
      content,
    };
  }

  private signedReview(
    caller: Caller,
    locked: LockedForReview,
    request: ReviewRequest,
    body: EntryBody,
    reviewHash: string,
  ) {
    const statement = canonicalJson({
      kind: 'review',
      sequenceId: locked.id,
      verdict: request.verdict,
      headHash: request.headHash,
      reviewHash,
      reviewerId: caller.person.id,
    });
    return {
      entryId: body.id,
      reviewerId: caller.person.id,
      verdict: request.verdict,
      headHash: request.headHash,
      statement,
      installationSignature: this.key.sign(statement),
      keyFingerprint: this.key.fingerprint,
    };
  }

  private async tell(
    context: Context,
    caller: Caller,
    locked: LockedForReview,
    request: ReviewRequest,
    after: FoldState,
  ): Promise<void> {
    await this.audit.append(context, {
      companyId: locked.companyId,
      openingId: locked.openingId,
      personId: caller.person.id,
      action: `sequence.${request.verdict}`,
      subject: locked.id,
      before: { state: locked.fold.state, headHash: locked.fold.headHash },
      after: { state: after.state, headHash: after.headHash },
    });
    await this.events.announce(context, locked.companyId as CompanyId, {
      kind: 'sequenceChanged',
      openingId: locked.openingId,
      sequenceId: locked.id,
      state: after.state,
    });
    if (request.verdict === 'sentBack') {
      await this.notice.send(context, caller.personName, locked, request.remarks);
      await this.reasked.renew(context, caller.person.id, locked);
    }
  }
}

function checkSignature(signature: Signature, name: string): void {
  if (isSignedBy(signature, name)) return;
  throw new DomainFailure('invalidInput', 'The signature box is empty.', [
    { path: 'body.signature', message: 'Sign, or type the name in its place.' },
  ]);
}

function checkVerdict(fold: FoldState, steps: readonly Step[], request: ReviewRequest, caller: Caller): void {
  if (!transitionFor(fold.state, request.verdict)) {
    throw new DomainFailure('wrongState', `This circuit is ${fold.state}, not submitted.`, [], {
      state: fold.state,
    });
  }
  if (fold.headHash !== request.headHash) {
    throw new DomainFailure('changedMeanwhile', 'Something arrived since you opened it. Look at it again.');
  }
  if (request.verdict === 'approved' && fold.recorders.includes(caller.person.id)) {
    throw new DomainFailure(
      'fourEyes',
      'You recorded some of this yourself. A second person has to approve it.',
    );
  }
  if (request.verdict !== 'sentBack') return;
  const known = new Set(steps.map((step) => step.key));
  const unknown = request.remarks.findIndex((remark) => !known.has(remark.stepKey));
  if (unknown >= 0) {
    throw new DomainFailure('invalidInput', 'A remark names a step that is not asked here.', [
      { path: `body.remarks.${unknown}.stepKey`, message: 'Unknown step.' },
    ]);
  }
}
