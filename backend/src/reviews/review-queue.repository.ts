import type { QueueItem } from '#shared/contracts/review-queue';
import type { OpeningId, PersonId } from '#shared/plant/ids';
import { managerOf, type Context } from '../database/transactions';

interface QueueRow extends Omit<QueueItem, 'submittedAt' | 'fourEyesBlocked'> {
  readonly submittedAt: Date;
  readonly recorders: string;
}

/** The last item of a page: what is outside comes first, then the oldest. */
export interface QueueCursor {
  readonly clean: 0 | 1;
  readonly submittedAt: string;
  readonly id: string;
}

export class ReviewQueueRepository {
  /** Submitted sequences of these openings: those with something outside first, each part oldest first. */
  async findPage(
    context: Context,
    openingIds: readonly OpeningId[],
    reader: PersonId,
    limit: number,
    after: QueueCursor | null,
  ): Promise<QueueItem[]> {
    if (openingIds.length === 0) return [];
    const cursor = after ? 'AND (s.outside_count = 0, s.submitted_at, s.id) > (?, ?, ?)' : '';
    const rows: QueueRow[] = await managerOf(context).query(
      `SELECT s.id AS sequenceId, c.id AS circuitId, c.level, o.id AS openingId, o.name AS openingName, o.time_zone AS timeZone,
              o.opening_date AS openingDate, c.code, c.description, c.area, s.submitted_at AS submittedAt,
              COALESCE(p.name, '') AS submittedBy, s.round, s.steps_total AS stepsTotal,
              s.outside_count AS outsideCount, s.not_applicable_count AS notApplicableCount,
              s.answered_twice_count AS answeredTwiceCount, s.late_count AS lateCount,
              (SELECT COUNT(*) FROM photo f WHERE f.sequence_id = s.id) AS photoCount,
              JSON_EXTRACT(s.fold, '$.recorders') AS recorders
         FROM sequence s
         JOIN circuit c ON c.id = s.circuit_id AND c.removed_at IS NULL
         JOIN opening o ON o.id = s.opening_id
         LEFT JOIN person p ON p.id = s.submitted_by
        WHERE s.opening_id IN (${openingIds.map(() => '?').join(',')}) AND s.state = 'submitted' ${cursor}
        ORDER BY s.outside_count = 0, s.submitted_at, s.id LIMIT ?`,
      [...openingIds, ...(after ? [after.clean, new Date(after.submittedAt), after.id] : []), limit],
    );
    return rows.map(({ recorders, submittedAt, photoCount, ...row }) => ({
      ...row,
      photoCount: Number(photoCount),
      submittedAt: submittedAt.toISOString(),
      fourEyesBlocked: JSON.stringify(recorders).includes(reader),
    }));
  }
}
