import { uuidv7 } from 'uuidv7';
import { plannedCircuits } from '#shared/contracts/defrost-circuits';
import type {
  DefrostPlanPage,
  DefrostPlanRequest,
  PlannedCircuit,
  SavedDefrostPlan,
  ScheduledDefrost,
} from '#shared/contracts/defrost-plans';
import { DomainFailure } from '#shared/failures/failure';
import type { OpeningId } from '#shared/plant/ids';
import { checkDefrostPlan } from '#shared/refrigeration/defrost/check-defrost-plan';
import type { DefrostFindings } from '#shared/refrigeration/defrost/defrost-breach';
import type { AuditService } from '../audit/audit.service';
import { isDuplicate, type Context, type Transactions } from '../database/transactions';
import type { Caller } from '../http/define-route';
import type { OpeningsService } from '../openings/openings.service';
import type { PlantService } from '../plant/plant.service';
import type { DefrostPlanRow, DefrostPlansRepository } from './defrost-plans.repository';
import { scheduledDefrosts } from './scheduled-defrosts';

type OpeningFacts = Parameters<PlantService['specifications']>[1];

/** The defrost plan of an opening: every save is a version of its own, checked here once more. */
export class DefrostPlansService {
  constructor(
    private readonly transactions: Transactions,
    private readonly plans: DefrostPlansRepository,
    private readonly openings: OpeningsService,
    private readonly plant: PlantService,
    private readonly audit: AuditService,
  ) {}

  /** The newest plan, and the circuits as the schedule has them now: it may have changed since. */
  async show(openingId: OpeningId): Promise<DefrostPlanPage> {
    const { outside } = this.transactions;
    const opening = await this.openings.find(outside, openingId);
    const newest = await this.plans.findNewest(outside, openingId);
    return {
      opening: {
        id: openingId,
        name: opening.name,
        timeZone: opening.timeZone,
        unitSystem: opening.unitSystem as 'us' | 'si',
      },
      circuits: await this.circuitsOf(outside, opening),
      newest: newest && planOf(newest),
    };
  }

  /**
   * Saves a plan as the next version. A plan that breaks rules is saved too: the breaches stand in it.
   *
   * @throws {DomainFailure} changedMeanwhile: another version was saved since `basedOn`; invalidInput: figures that
   *   nothing can be checked with, such as a duration that nobody stated
   */
  async save(caller: Caller, openingId: OpeningId, request: DefrostPlanRequest): Promise<SavedDefrostPlan> {
    const id = uuidv7();
    try {
      await this.transactions.run(async (context) => {
        const opening = await this.openings.lockForSchedule(context, openingId);
        const last = await this.plans.findLastVersion(context, openingId);
        if (last !== request.basedOn) throw savedMeanwhile(last);
        const scheduled = await this.circuitsOf(context, opening);
        const circuits = plannedCircuits(scheduled, request.details);
        const findings = findingsOf(circuits, request);
        const version = last + 1;
        await this.plans.insert(context, {
          id,
          companyId: opening.companyId,
          openingId,
          version,
          rules: JSON.stringify(request.rules),
          details: JSON.stringify(request.details),
          circuits: JSON.stringify(circuits),
          plan: JSON.stringify(request.plan),
          findings: JSON.stringify({ breaches: findings.breaches, notes: findings.notes }),
          createdBy: caller.person.id,
          createdAt: new Date(),
        });
        await this.audit.append(context, {
          companyId: opening.companyId,
          openingId,
          personId: caller.person.id,
          action: 'defrostPlan.saved',
          subject: id,
          after: { version, rules: request.rules, breaches: findings.breaches.length },
        });
      });
    } catch (error) {
      if (!isDuplicate(error)) throw error;
      throw savedMeanwhile(null);
    }
    return this.read(openingId, id);
  }

  /** The id of the newest plan, for a package's snapshot; `null` when there is none. */
  async newestId(context: Context, openingId: OpeningId): Promise<string | null> {
    return (await this.plans.findNewest(context, openingId))?.id ?? null;
  }

  /** @throws {DomainFailure} notFound */
  async read(openingId: OpeningId, id: string): Promise<SavedDefrostPlan> {
    const row = await this.plans.find(this.transactions.outside, openingId, id);
    if (!row) throw new DomainFailure('notFound', 'There is no such defrost plan.');
    return planOf(row);
  }

  private async circuitsOf(context: Context, opening: OpeningFacts): Promise<ScheduledDefrost[]> {
    return scheduledDefrosts(await this.plant.specifications(context, opening));
  }
}

function findingsOf(circuits: readonly PlannedCircuit[], request: DefrostPlanRequest): DefrostFindings {
  const check = checkDefrostPlan(circuits, request.rules, request.plan);
  if (check.ok) return check;
  const codes = new Map<string | null, string>(circuits.map(({ id, code }) => [id, code]));
  const places = check.problems.map(({ circuitId, field }) => ({
    path: circuitId === null ? `body.rules.${field}` : `body.details.${circuitId}.${field}`,
    message: `Missing or impossible${circuitId === null ? '' : ` for ${codes.get(circuitId) ?? circuitId}`}.`,
  }));
  throw new DomainFailure('invalidInput', 'The plan can not be checked with these figures.', places);
}

function savedMeanwhile(version: number | null): DomainFailure {
  return new DomainFailure('changedMeanwhile', 'Another version was saved meanwhile.', [], { version });
}

function planOf(row: DefrostPlanRow): SavedDefrostPlan {
  const findings = JSON.parse(row.findings) as Pick<SavedDefrostPlan, 'breaches' | 'notes'>;
  return {
    id: row.id,
    version: row.version,
    rules: JSON.parse(row.rules) as SavedDefrostPlan['rules'],
    details: JSON.parse(row.details) as SavedDefrostPlan['details'],
    circuits: JSON.parse(row.circuits) as SavedDefrostPlan['circuits'],
    plan: JSON.parse(row.plan) as SavedDefrostPlan['plan'],
    breaches: findings.breaches,
    notes: findings.notes,
    createdAt: row.createdAt.toISOString(),
    createdByName: row.createdByName,
  };
}
