import type * as z from 'zod/mini';
import { may } from '#shared/access/may';
import type { Person } from '#shared/access/roles';
import type { queueSchema } from '#shared/contracts/review-queue';
import type { OpeningId } from '#shared/plant/ids';
import type { Transactions } from '../database/transactions';
import type { OpeningsService } from '../openings/openings.service';
import type { QueueCursor, ReviewQueueRepository } from './review-queue.repository';

/** What waits for a lead, over all of that lead's openings. */
export class ReviewQueueService {
  constructor(
    private readonly transactions: Transactions,
    private readonly queue: ReviewQueueRepository,
    private readonly openings: OpeningsService,
  ) {}

  async list(
    person: Person,
    only: OpeningId | undefined,
    limit: number,
    after: string | undefined,
  ): Promise<z.infer<typeof queueSchema>> {
    const ids = (await this.reviewable(person)).filter((id) => only === undefined || id === only);
    const items = await this.queue.findPage(
      this.transactions.outside,
      ids,
      person.id,
      limit,
      parseCursor(after),
    );
    const last = items.at(-1);
    return {
      items,
      next:
        items.length === limit && last
          ? `${last.outsideCount === 0 ? 1 : 0} ${last.submittedAt} ${last.sequenceId}`
          : null,
    };
  }

  private async reviewable(person: Person): Promise<OpeningId[]> {
    const subjects = await this.openings.subjectsOf(person);
    return subjects
      .filter((subject) => may(person, 'review.read', subject))
      .map((subject) => subject.openingId);
  }
}

function parseCursor(text: string | undefined): QueueCursor | null {
  const [clean, submittedAt, id] = (text ?? '').split(' ');
  if (!submittedAt || !id || Number.isNaN(Date.parse(submittedAt))) return null;
  return { clean: clean === '1' ? 1 : 0, submittedAt, id };
}
