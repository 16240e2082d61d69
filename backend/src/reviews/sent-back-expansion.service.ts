import type { PersonId } from '#shared/plant/ids';
import type { Context } from '../database/transactions';
import type { OpeningsService } from '../openings/openings.service';
import type { PlantService } from '../plant/plant.service';
import type { ExpansionService } from '../sequences/expansion.service';
import type { LockedForReview } from '../sequences/sequence-review-desk.service';

/** What goes back to an installer is asked by the schedule that stands now, in the transaction of the verdict. */
export class SentBackExpansion {
  constructor(
    private readonly openings: OpeningsService,
    private readonly plant: PlantService,
    private readonly expansion: ExpansionService,
  ) {}

  async renew(context: Context, leadId: PersonId, locked: LockedForReview): Promise<void> {
    const opening = await this.openings.find(context, locked.openingId);
    const [specification] = await this.plant.specifications(context, opening, [locked.circuitId]);
    await this.expansion.catchUp(context, locked, specification, leadId);
  }
}
