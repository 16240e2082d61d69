import { uuidv7 } from 'uuidv7';
import type { Person } from '#shared/access/roles';
import type { ScheduleImport } from '#shared/contracts/schedules';
import { DomainFailure } from '#shared/failures/failure';
import type { CompanyId, OpeningId } from '#shared/plant/ids';
import type { AuditService } from '../audit/audit.service';
import type { Context, Transactions } from '../database/transactions';
import type { LiveEventsService } from '../events/live-events.service';
import type { OpeningsService } from '../openings/openings.service';
import type { PlantService } from '../plant/plant.service';
import { designationKnownTo } from '../refrigerants/company-tables';
import type { RefrigerantsService } from '../refrigerants/refrigerants.service';
import type { ExpansionService } from '../sequences/expansion.service';
import { mergeSchedule } from './merge-schedule';
import type { ParsedSchedule } from './parsed-schedule';
import { parseSchedule } from './schedule-parser';

/** Schedules in: a file becomes plant and sequences, whole or not at all. */
export class SchedulesService {
  constructor(
    private readonly transactions: Transactions,
    private readonly openings: OpeningsService,
    private readonly plant: PlantService,
    private readonly refrigerants: RefrigerantsService,
    private readonly expansion: ExpansionService,
    private readonly audit: AuditService,
    private readonly events: LiveEventsService,
  ) {}

  /**
   * Reads a schedule and, when asked to, stores it in one transaction.
   *
   * @throws {DomainFailure} notATable, tooLarge, scheduleRefused; `facts.rows` names row, column and reason of each
   */
  async import(person: Person, openingId: OpeningId, bytes: Buffer, store: boolean): Promise<ScheduleImport> {
    const { outside } = this.transactions;
    const { companyId } = await this.openings.find(outside, openingId);
    const tables = await this.refrigerants.inUse(outside, companyId);
    const reading = parseSchedule(bytes, designationKnownTo(tables));
    if (!reading.ok) {
      const [first] = reading.problems;
      throw new DomainFailure(
        reading.code,
        reading.problems.length === 1 && first
          ? first.message
          : `The schedule has ${reading.problems.length} problems. Nothing was stored.`,
        [],
        { rows: reading.problems },
      );
    }
    const counts = countOf(reading.schedule);
    if (!store) return { ...counts, stored: false, revision: 0, sequences: 0 };
    return this.transactions.run(async (context) => {
      const { revision, sequences } = await this.store(context, person, openingId, reading.schedule);
      return { ...counts, stored: true, revision, sequences };
    });
  }

  private async store(
    context: Context,
    person: Person,
    openingId: OpeningId,
    schedule: ParsedSchedule,
  ): Promise<{ revision: number; sequences: number }> {
    const opening = await this.openings.lockForSchedule(context, openingId);
    const owner = { companyId: opening.companyId as CompanyId, openingId };
    const known = await this.plant.everything(context, openingId);
    await this.plant.replace(context, mergeSchedule(owner, schedule, known, new Date(), uuidv7));
    const specifications = await this.plant.specifications(context, opening);
    const sequences = await this.expansion.expand(context, owner, specifications, person.id);
    const revision = opening.scheduleRevision + 1;
    await this.openings.setScheduleRevision(context, openingId, revision);
    await this.audit.append(context, {
      ...owner,
      personId: person.id,
      action: 'schedule.imported',
      subject: openingId,
      before: { revision: opening.scheduleRevision, circuits: known.circuits.length },
      after: { revision, circuits: specifications.length },
    });
    await this.events.announce(context, owner.companyId, { kind: 'scheduleChanged', openingId });
    return { revision, sequences };
  }
}

function countOf(
  schedule: ParsedSchedule,
): Pick<ScheduleImport, 'systems' | 'suctionGroups' | 'circuits' | 'fixtures' | 'coils'> {
  const suctionGroups = schedule.systems.flatMap((system) => system.suctionGroups);
  const circuits = suctionGroups.flatMap((group) => group.circuits);
  const fixtures = circuits.flatMap((circuit) => circuit.fixtures);
  return {
    systems: schedule.systems.length,
    suctionGroups: suctionGroups.length,
    circuits: circuits.length,
    fixtures: fixtures.length,
    coils: fixtures.reduce((sum, fixture) => sum + fixture.coilCount, 0),
  };
}
