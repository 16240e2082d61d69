import { managerOf, type Context } from '../database/transactions';
import { ReviewEntity } from './review.entity';

export class ReviewsRepository {
  async insert(context: Context, review: ReviewEntity): Promise<void> {
    await managerOf(context).insert(ReviewEntity, review);
  }
}
