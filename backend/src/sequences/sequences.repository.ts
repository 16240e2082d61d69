import { In } from 'typeorm';
import type { CircuitId, CompanyId, EntryId, OpeningId, PersonId, SequenceId } from '#shared/plant/ids';
import { managerOf, type Context } from '../database/transactions';
import type { FoldColumns } from './chain-appending';
import { EntryEntity } from './entry.entity';
import { SequenceEntity } from './sequence.entity';
import { StepListEntity } from './step-list.entity';

/** What appending needs of a sequence's row; kept short, because it is read for every entry. */
export interface LockedSequence {
  readonly id: SequenceId;
  readonly companyId: CompanyId;
  readonly openingId: OpeningId;
  readonly circuitId: CircuitId;
  readonly stepListHash: string;
  readonly fold: string;
}

const LOCKED_COLUMNS = `id, company_id AS companyId, opening_id AS openingId, circuit_id AS circuitId,
  step_list_hash AS stepListHash, fold`;

export class SequencesRepository {
  /** Takes the sequence's row lock: entries of one sequence are appended one after the other. */
  async lock(context: Context, id: SequenceId): Promise<LockedSequence | null> {
    const rows: LockedSequence[] = await managerOf(context).query(
      `SELECT ${LOCKED_COLUMNS} FROM sequence WHERE id = ? FOR UPDATE`,
      [id],
    );
    return rows[0] ?? null;
  }

  async find(context: Context, id: SequenceId): Promise<SequenceEntity | null> {
    return managerOf(context).findOneBy(SequenceEntity, { id });
  }

  async findByCircuits(context: Context, circuitIds: readonly CircuitId[]): Promise<SequenceEntity[]> {
    if (circuitIds.length === 0) return [];
    return managerOf(context).findBy(SequenceEntity, { circuitId: In([...circuitIds]) });
  }

  async insert(context: Context, rows: readonly SequenceEntity[]): Promise<void> {
    if (rows.length > 0) await managerOf(context).insert(SequenceEntity, [...rows]);
  }

  async update(
    context: Context,
    id: SequenceId,
    change: FoldColumns & Partial<Pick<SequenceEntity, 'submittedAt' | 'submittedBy' | 'stepListHash'>>,
  ): Promise<void> {
    await managerOf(context).createQueryBuilder().update(SequenceEntity).set(change).where({ id }).execute();
  }

  async insertEntries(context: Context, rows: readonly EntryEntity[]): Promise<void> {
    await managerOf(context)
      .createQueryBuilder()
      .insert()
      .into(EntryEntity)
      .values([...rows])
      .updateEntity(false)
      .execute();
  }

  /** Those of the ids that are stored, with what the server said of them then. */
  async findEntriesById(context: Context, ids: readonly EntryId[]): Promise<EntryEntity[]> {
    if (ids.length === 0) return [];
    return managerOf(context).findBy(EntryEntity, { id: In([...ids]) });
  }

  /** A sequence's entries in order, up to a position. */
  async findEntries(context: Context, sequenceId: SequenceId, upTo?: number): Promise<EntryEntity[]> {
    const query = managerOf(context)
      .createQueryBuilder(EntryEntity, 'entry')
      .where('entry.sequenceId = :sequenceId', { sequenceId })
      .orderBy('entry.position', 'ASC');
    if (upTo !== undefined) query.andWhere('entry.position <= :upTo', { upTo });
    return query.getMany();
  }

  async findStepList(context: Context, companyId: CompanyId, hash: string): Promise<string | null> {
    const row = await managerOf(context).findOneBy(StepListEntity, { companyId, hash });
    return row?.content ?? null;
  }

  async findStepLists(
    context: Context,
    companyId: CompanyId,
    hashes: readonly string[],
  ): Promise<Pick<StepListEntity, 'hash' | 'content'>[]> {
    if (hashes.length === 0) return [];
    return managerOf(context).findBy(StepListEntity, { companyId, hash: In([...hashes]) });
  }

  /** Content-addressed: the same steps are stored once. */
  async insertStepLists(context: Context, rows: readonly StepListEntity[]): Promise<void> {
    if (rows.length === 0) return;
    await managerOf(context)
      .createQueryBuilder()
      .insert()
      .into(StepListEntity)
      .values([...rows])
      .orIgnore()
      .updateEntity(false)
      .execute();
  }

  /** Whether the circuit is assigned to the person, or the person recorded something on it. */
  async isWorkOf(context: Context, id: SequenceId, personId: PersonId): Promise<boolean> {
    const rows: unknown[] = await managerOf(context).query(
      `SELECT 1 FROM sequence s JOIN circuit c ON c.id = s.circuit_id
        WHERE s.id = ? AND (c.assignee_id = ?
           OR EXISTS (SELECT 1 FROM entry e WHERE e.sequence_id = s.id AND e.author_id = ?))`,
      [id, personId, personId],
    );
    return rows.length > 0;
  }

  /** Who last submitted a sequence and to whom a lead's remarks go. */
  async findRecorders(context: Context, sequenceId: SequenceId): Promise<PersonId[]> {
    const rows: { id: PersonId }[] = await managerOf(context).query(
      `SELECT DISTINCT author_id AS id FROM entry WHERE sequence_id = ? AND kind IN ('answer', 'notApplicable', 'submission')`,
      [sequenceId],
    );
    return rows.map((row) => row.id);
  }
}
