import { uuidv7 } from 'uuidv7';
import type { Remark } from '#shared/sequences/entry';
import type { Context } from '../database/transactions';
import type { JobsService } from '../jobs/jobs.service';
import { sentBackMail } from '../mail/mail-texts';
import type { OpeningsService } from '../openings/openings.service';
import type { PeopleService } from '../people/people.service';
import type { PlantService } from '../plant/plant.service';
import type { LockedForReview, SequenceReviewDesk } from '../sequences/sequence-review-desk.service';

/** The mail that tells installers what a lead asks again; enqueued in the transaction of the verdict. */
export class SentBackNotice {
  constructor(
    private readonly desk: SequenceReviewDesk,
    private readonly openings: OpeningsService,
    private readonly plant: PlantService,
    private readonly people: PeopleService,
    private readonly jobs: JobsService,
    private readonly publicUrl: string,
  ) {}

  async send(
    context: Context,
    leadName: string,
    locked: LockedForReview,
    remarks: readonly Remark[],
  ): Promise<void> {
    const opening = await this.openings.find(context, locked.openingId);
    const [specification] = await this.plant.specifications(context, opening, [locked.circuitId]);
    const recorders = new Set(await this.desk.recorders(context, locked.id));
    const titles = new Map(locked.steps.map((step) => [step.key, step.title]));
    for (const person of await this.people.recipients(context, locked.openingId)) {
      if (!recorders.has(person.id)) continue;
      const mail = sentBackMail(person, {
        circuit: specification?.circuit.code ?? '',
        opening: opening.name,
        lead: leadName,
        remarks: remarks.map((remark) => ({
          step: titles.get(remark.stepKey)?.[person.language] ?? remark.stepKey,
          text: remark.text,
        })),
        url: `${this.publicUrl}/work/${locked.id}`,
      });
      await this.jobs.enqueue(context, locked.companyId, 'mail', `mail ${uuidv7()}`, mail);
    }
  }
}
