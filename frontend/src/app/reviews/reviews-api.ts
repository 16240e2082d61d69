import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import { PAGE_SIZE_MAX } from '#shared/contracts/paging';
import { queueSchema, type QueueItem } from '#shared/contracts/review-queue';
import {
  reviewResponseSchema,
  sequenceDetailSchema,
  type ReviewRequest,
  type SequenceDetail,
} from '#shared/contracts/sequences';
import type { OpeningId, SequenceId } from '#shared/plant/ids';
import { readAllPages, type WholeList } from '../ui/pages/all-pages';
import { parsed } from '../ui/pages/parsed';

/** More than a lead can look through in a day. */
const MOST = 1000;

/** The review queue, one sequence whole, and the verdict on it. */
@Injectable({ providedIn: 'root' })
export class ReviewsApi {
  private readonly http = inject(HttpClient);

  /** What waits for a review, in all openings of the reader or in one. */
  queue(openingId: OpeningId | null): Promise<WholeList<QueueItem>> {
    return readAllPages((after) => {
      const params = {
        limit: PAGE_SIZE_MAX,
        ...(openingId === null ? {} : { openingId }),
        ...(after === null ? {} : { after }),
      };
      return parsed(this.http.get('/api/review-queue', { params }), queueSchema);
    }, MOST);
  }

  sequence(sequenceId: SequenceId): Promise<SequenceDetail> {
    return parsed(this.http.get(`/api/sequences/${sequenceId}`), sequenceDetailSchema);
  }

  /** Gives the verdict. Fails with `passwordNeeded`, `fourEyes`, `changedMeanwhile` or `wrongState`. */
  async review(sequenceId: SequenceId, request: ReviewRequest): Promise<void> {
    await parsed(this.http.post(`/api/sequences/${sequenceId}/reviews`, request), reviewResponseSchema);
  }

  /** Where a photo's bytes are read from: always our own server. */
  photoUrl(sequenceId: SequenceId, sha256: string, size: 'full' | 'thumbnail'): string {
    return `/api/sequences/${sequenceId}/photos/${sha256}?size=${size}`;
  }
}
