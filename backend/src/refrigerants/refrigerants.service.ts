import { uuidv7 } from 'uuidv7';
import type { Person } from '#shared/access/roles';
import type { MakersTableFacts } from '#shared/checklist/facts';
import { makersTableOf } from '#shared/checklist/saturation-of';
import type {
  NewRefrigerantTable,
  RefrigerantTable,
  RefrigerantTableList,
} from '#shared/contracts/refrigerants';
import { DomainFailure } from '#shared/failures/failure';
import type { PersonId } from '#shared/plant/ids';
import { checkMakersTable } from '#shared/refrigeration/makers-table/check-makers-table';
import { usualDesignation } from '#shared/refrigeration/saturation/designation';
import { refrigerantKey, REFRIGERANTS } from '#shared/refrigeration/saturation/refrigerants';
import type { AuditService } from '../audit/audit.service';
import type { Context, Transactions } from '../database/transactions';
import type { PeopleService } from '../people/people.service';
import { tableOf, type CompanyTables } from './company-tables';
import type { RefrigerantTableEntity } from './refrigerant-table.entity';
import type { RefrigerantsRepository, RefrigerantTableCursor } from './refrigerants.repository';

/** Refrigerants by their makers' own tables: entered once, never changed, the newest of a designation in use. */
export class RefrigerantsService {
  constructor(
    private readonly transactions: Transactions,
    private readonly tables: RefrigerantsRepository,
    private readonly people: PeopleService,
    private readonly audit: AuditService,
  ) {}

  /** The tables of the person's company, newest first. */
  async list(person: Person, limit: number, after: string | undefined): Promise<RefrigerantTableList> {
    const { outside } = this.transactions;
    const rows = await this.tables.findPage(outside, person.companyId, limit, cursorOf(after));
    const newest = await this.tables.findNewestIds(outside, person.companyId);
    const authors = rows.map((row) => row.createdBy as PersonId);
    const names = await this.people.names(outside, [...new Set(authors)]);
    const last = rows.at(-1);
    return {
      items: rows.map((row) => ({
        ...factsOf(row),
        id: row.id,
        createdByName: names.find(({ id }) => id === row.createdBy)?.name ?? '',
        createdAt: row.createdAt.toISOString(),
        isInUse: newest.has(row.id),
      })),
      next: rows.length === limit && last ? `${last.createdAt.toISOString()} ${last.id}` : null,
    };
  }

  /**
   * Keeps a table for the person's company. What is expanded from now on works with it; sequences that are there
   * already keep theirs.
   *
   * @throws {DomainFailure} invalidInput with `facts.problems` when the figures don't hold together, or when some are
   *   asked about and nobody has confirmed them; alreadyThere when the table in use says the same
   */
  async create(person: Person, request: NewRefrigerantTable): Promise<RefrigerantTable> {
    const { confirmed, ...typed } = request;
    const designation = await this.designationOf(person.companyId, typed.designation);
    const table: MakersTableFacts = { ...typed, designation };
    refuseProblems(table, confirmed);
    const row: RefrigerantTableEntity = {
      ...table,
      id: uuidv7(),
      companyId: person.companyId,
      designationKey: refrigerantKey(table.designation),
      points: JSON.stringify(table.points),
      createdBy: person.id,
      createdAt: new Date(),
    };
    await this.transactions.run(async (context) => {
      await this.refuseRepetition(context, row);
      await this.tables.insert(context, row);
      await this.audit.append(context, {
        companyId: person.companyId,
        personId: person.id,
        action: 'refrigerantTable.added',
        subject: row.id,
        after: { ...table, confirmed },
      });
    });
    const [author] = await this.people.names(this.transactions.outside, [person.id]);
    return {
      ...table,
      id: row.id,
      createdByName: author?.name ?? '',
      createdAt: row.createdAt.toISOString(),
      isInUse: true,
    };
  }

  /** The tables that a company's schedules are expanded with now. */
  async inUse(context: Context, companyId: string): Promise<CompanyTables> {
    const rows = await this.tables.findNewest(context, companyId);
    return new Map(rows.map((row) => [row.designationKey, factsOf(row)]));
  }

  /** A newer sheet keeps the spelling of the one before: another one would ask every step of its circuits again. */
  private async designationOf(companyId: string, typed: string): Promise<string> {
    const known = tableOf(await this.inUse(this.transactions.outside, companyId), typed);
    return known?.designation ?? usualDesignation(typed);
  }

  /** Somebody pressed twice, or another lead was quicker: a second row of the same sheet could never be taken away. */
  private async refuseRepetition(context: Context, row: RefrigerantTableEntity): Promise<void> {
    const newest = await this.tables.findNewest(context, row.companyId);
    const current = newest.find(({ designationKey }) => designationKey === row.designationKey);
    if (current && current.points === row.points && sheetOf(current) === sheetOf(row))
      throw new DomainFailure('alreadyThere', 'This table is kept already, and in use.');
  }
}

/** A safety class put right is another sheet: it has to come in, though every figure is the same. */
const sheetOf = ({ issuer, edition, safetyClass }: RefrigerantTableEntity): string =>
  JSON.stringify([issuer, edition, safetyClass]);

function refuseProblems(table: MakersTableFacts, confirmed: boolean): void {
  const problems = checkMakersTable(makersTableOf(table), [...REFRIGERANTS.values()]);
  const isRefused = problems.some(({ severity }) => severity === 'refuse');
  if (problems.length === 0 || (confirmed && !isRefused)) return;
  const message = isRefused
    ? 'The figures of this table do not hold together. Nothing was stored.'
    : 'Some figures of this table are unusual; confirm that they stand so in the sheet. Nothing was stored.';
  throw new DomainFailure('invalidInput', message, [], { problems });
}

const factsOf = (row: RefrigerantTableEntity): MakersTableFacts => ({
  designation: row.designation,
  issuer: row.issuer,
  edition: row.edition,
  printedStepPa: row.printedStepPa,
  safetyClass: row.safetyClass,
  points: JSON.parse(row.points) as MakersTableFacts['points'],
});

function cursorOf(after: string | undefined): RefrigerantTableCursor | null {
  const [moment = '', id] = (after ?? '').split(' ');
  const createdAt = new Date(moment);
  return id === undefined || Number.isNaN(createdAt.getTime()) ? null : { createdAt, id };
}
