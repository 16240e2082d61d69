import { uuidv7 } from 'uuidv7';
import type * as z from 'zod/mini';
import type { Person } from '#shared/access/roles';
import type { Language } from '#shared/checklist/text';
import type {
  circuitListSchema,
  NewOpening,
  OpeningDetail,
  openingListSchema,
  OpeningSummary,
} from '#shared/contracts/openings';
import { DomainFailure } from '#shared/failures/failure';
import type { CircuitId, CompanyId, OpeningId, PersonId, SystemId } from '#shared/plant/ids';
import { standardAtmosphere } from '#shared/refrigeration/gauge-pressure';
import { metre } from '#shared/units/quantity';
import type { AuditService } from '../audit/audit.service';
import type { Context, Transactions } from '../database/transactions';
import type { LiveEventsService } from '../events/live-events.service';
import type { PeopleService } from '../people/people.service';
import type { PlantService } from '../plant/plant.service';
import type { CircuitListRepository, CircuitListRow } from './circuit-list.repository';
import type { OpeningEntity } from './opening.entity';
import type { OpeningsRepository } from './openings.repository';

type OpeningList = z.infer<typeof openingListSchema>;
type CircuitList = z.infer<typeof circuitListSchema>;

/** Ordinals begin below zero: systems, then suction groups, then circuits from 0. */
const BEFORE_ALL = -1_000_000;

const RECORDING_ROLES: readonly string[] = ['installer', 'lead'];

export class OpeningsService {
  constructor(
    private readonly transactions: Transactions,
    private readonly openings: OpeningsRepository,
    private readonly circuits: CircuitListRepository,
    private readonly plant: PlantService,
    private readonly people: PeopleService,
    private readonly audit: AuditService,
    private readonly events: LiveEventsService,
  ) {}

  async list(person: Person, limit: number, after: string | undefined): Promise<OpeningList> {
    const { outside } = this.transactions;
    const [date, id] = (after ?? '').split(' ');
    const page = await this.openings.findPage(
      outside,
      person.memberships.map((membership) => membership.openingId),
      person.companyRole === 'admin' ? person.companyId : null,
      limit,
      /^\d{4}-\d\d-\d\d$/.test(date ?? '') && id ? { date: date ?? '', id } : null,
    );
    const summaries = await this.summarise(outside, page);
    const last = page.at(-1);
    return {
      items: summaries,
      next: page.length === limit && last ? `${last.openingDate} ${last.id}` : null,
    };
  }

  /** Makes an opening; whoever makes it is a lead in it. */
  async create(person: Person, opening: NewOpening): Promise<OpeningDetail> {
    const id = uuidv7() as OpeningId;
    const now = new Date();
    if (!isTimeZone(opening.timeZone)) {
      throw new DomainFailure('invalidInput', 'The time zone is not known.', [
        { path: 'body.timeZone', message: 'Use a name such as America/Denver.' },
      ]);
    }
    await this.transactions.run(async (context) => {
      await this.openings.insert(
        context,
        { id, companyId: person.companyId, ...opening, scheduleRevision: 0, createdAt: now },
        {
          id: uuidv7(),
          companyId: person.companyId,
          openingId: id,
          personId: person.id,
          role: 'lead',
          createdAt: now,
          endedAt: null,
        },
      );
      await this.audit.append(context, {
        companyId: person.companyId,
        openingId: id,
        personId: person.id,
        action: 'opening.created',
        subject: id,
        after: opening,
      });
    });
    return this.show(id);
  }

  async show(id: OpeningId): Promise<OpeningDetail> {
    const { outside } = this.transactions;
    const opening = await this.openings.find(outside, id);
    if (!opening) throw new DomainFailure('notFound', 'There is no such opening.');
    const [summary] = await this.summarise(outside, [opening]);
    const atmosphere = standardAtmosphere(metre(opening.elevationM));
    return {
      ...(summary as OpeningSummary),
      elevationM: opening.elevationM,
      atmospherePaAbs: atmosphere.ok ? atmosphere.pressure : Number.NaN,
      timeZone: opening.timeZone,
      unitSystem: opening.unitSystem as 'us' | 'si',
      language: opening.language as Language,
      scheduleRevision: opening.scheduleRevision,
      systems: await this.copperLines(outside, id),
    };
  }

  async listCircuits(openingId: OpeningId, limit: number, after: string | undefined): Promise<CircuitList> {
    const rows = await this.circuits.findOfOpening(
      this.transactions.outside,
      openingId,
      limit,
      after === undefined ? BEFORE_ALL : Number.parseInt(after, 10) || 0,
    );
    return { items: rows.map(toRow), next: rows.length === limit ? String(rows.at(-1)?.ordinal) : null };
  }

  /** What a person has to do, over all of their openings. */
  async listAssigned(person: Person, limit: number, after: string | undefined): Promise<CircuitList> {
    const [openingId, ordinal] = (after ?? '').split(' ');
    const rows = await this.circuits.findOfAssignee(
      this.transactions.outside,
      person.id,
      person.memberships.map((membership) => membership.openingId),
      limit,
      openingId && /^-?\d{1,9}$/.test(ordinal ?? '') ? { openingId, ordinal: Number(ordinal) } : null,
    );
    const last = rows.at(-1);
    return {
      items: rows.map(toRow),
      next: rows.length === limit && last ? `${last.openingId} ${last.ordinal}` : null,
    };
  }

  /**
   * Gives circuits to somebody, or to nobody.
   *
   * @throws {DomainFailure} invalidInput: a circuit of another opening, or a person without a recording role here
   */
  async assign(
    person: Person,
    openingId: OpeningId,
    circuitIds: readonly CircuitId[],
    assigneeId: PersonId | null,
  ): Promise<void> {
    await this.transactions.run(async (context) => {
      // The opening's lock: an import that runs now would write the assignments back that it read before.
      const opening = await this.lockForSchedule(context, openingId);
      if (assigneeId !== null) await this.checkAssignee(context, openingId, assigneeId);
      await this.plant.assign(context, openingId, circuitIds, assigneeId);
      await this.audit.append(context, {
        companyId: opening.companyId,
        openingId,
        personId: person.id,
        action: 'circuits.assigned',
        subject: openingId,
        after: { circuitIds, assigneeId },
      });
      await this.events.announce(context, opening.companyId, { kind: 'scheduleChanged', openingId });
    });
  }

  /** Takes the opening's row lock for an import. */
  async lockForSchedule(context: Context, id: OpeningId): Promise<OpeningEntity> {
    const opening = await this.openings.lock(context, id);
    if (!opening) throw new DomainFailure('notFound', 'There is no such opening.');
    return opening;
  }

  async setScheduleRevision(context: Context, id: OpeningId, revision: number): Promise<void> {
    await this.openings.setScheduleRevision(context, id, revision);
  }

  /** The opening's own row. @throws {DomainFailure} notFound */
  async find(context: Context, id: OpeningId): Promise<OpeningEntity> {
    const opening = await this.openings.find(context, id);
    if (!opening) throw new DomainFailure('notFound', 'There is no such opening.');
    return opening;
  }

  /** Every opening that the person could have to do with, for asking `may` about each. */
  async subjectsOf(person: Person): Promise<{ companyId: CompanyId; openingId: OpeningId }[]> {
    return this.openings.findSubjects(
      this.transactions.outside,
      person.memberships.map((membership) => membership.openingId),
      person.companyRole === 'admin' ? person.companyId : null,
    );
  }

  private async checkAssignee(context: Context, openingId: OpeningId, id: PersonId): Promise<void> {
    const people = await this.people.recipients(context, openingId);
    if (people.some((candidate) => candidate.id === id && RECORDING_ROLES.includes(candidate.role))) return;
    throw new DomainFailure('invalidInput', 'Circuits go to installers and leads of this opening.', [
      { path: 'body.personId', message: 'This person has no such role here.' },
    ]);
  }

  private async summarise(context: Context, openings: readonly OpeningEntity[]): Promise<OpeningSummary[]> {
    const counts = await this.openings.countCircuits(
      context,
      openings.map((opening) => opening.id as OpeningId),
    );
    return openings.map((opening) => ({
      id: opening.id as OpeningId,
      companyId: opening.companyId as CompanyId,
      name: opening.name,
      address: opening.address,
      openingDate: opening.openingDate,
      contractorName: opening.contractorName,
      counts: counts.get(opening.id as OpeningId) ?? {
        open: 0,
        underWay: 0,
        submitted: 0,
        sentBack: 0,
        approved: 0,
      },
    }));
  }

  private async copperLines(context: Context, id: OpeningId): Promise<OpeningDetail['systems']> {
    const systems = await this.plant.systemsOf(context, id);
    const rows: CircuitListRow[] = [];
    // In pages, so that no single statement grows with the store.
    for (let after = BEFORE_ALL; ; after = rows.at(-1)?.ordinal ?? after) {
      const page = await this.circuits.findOfOpening(context, id, 500, after);
      rows.push(...page);
      if (page.length < 500) break;
    }
    return systems.map((system) => ({
      id: system.id as SystemId,
      name: system.name,
      refrigerant: system.refrigerant,
      joints: rows
        .filter((row) => row.level === 'circuit' && row.systemName === system.name)
        .map(({ circuitId, code, state }) => ({ circuitId, code, state })),
      work: rows
        .filter((row) => row.level !== 'circuit' && row.systemName === system.name)
        .map(({ circuitId, code, state, level }) => ({ circuitId, code, state, level })),
    }));
  }
}

function toRow({ ordinal: _ordinal, ...row }: CircuitListRow): CircuitList['items'][number] {
  return row;
}

function isTimeZone(name: string): boolean {
  try {
    new Intl.DateTimeFormat('en', { timeZone: name });
    return true;
  } catch {
    // RangeError: not a name of the time zone database.
    return false;
  }
}
