import { ChangeDetectionStrategy, Component, computed, inject, input, resource } from '@angular/core';
import { RouterLink } from '@angular/router';
import { TranslocoDirective } from '@jsverse/transloco';
import type { Caution } from '#shared/checklist/text';
import { rankCoils, type FloodHunt, type FloodHuntRow } from '#shared/contracts/flood-hunt';
import type { OpeningDetail } from '#shared/contracts/openings';
import type { OpeningId, SuctionGroupId } from '#shared/plant/ids';
import { Connectivity } from '../offline/connectivity';
import { Session } from '../session/session';
import { CautionNote } from '../ui/caution/caution-note';
import { EmptyNote } from '../ui/notes/empty-note';
import { LoadingNote } from '../ui/notes/loading-note';
import { OfflineNote } from '../ui/notes/offline-note';
import { ProblemNote } from '../ui/notes/problem-note';
import { lastRead } from '../ui/pages/last-read';
import { QuantityOf } from '../ui/quantity-of';
import { Unbroken } from '../ui/words/unbroken';
import { FloodHuntApi } from './flood-hunt-api';

/** Liquid that reaches a compressor breaks it, and a compressor that breaks throws parts. */
const CAUTION: Caution = {
  hazard: 'pressure',
  text: {
    en: 'Liquid is coming back. Stop a compressor that knocks or frosts at the crankcase before you go and look; keep hands off hot discharge and out of fans.',
    es: 'Está regresando líquido. Pare el compresor que golpee o tenga escarcha en el cárter antes de ir a revisar; no toque la descarga caliente ni meta la mano a los ventiladores.',
  },
};

/** Where liquid comes back from: the coils of a suction group, the likeliest first, with what speaks against each. */
@Component({
  selector: 'app-flood-hunt-page',
  imports: [
    CautionNote,
    EmptyNote,
    LoadingNote,
    OfflineNote,
    ProblemNote,
    QuantityOf,
    RouterLink,
    TranslocoDirective,
    Unbroken,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './flood-hunt-page.html',
  styleUrl: './flood-hunt-page.scss',
})
export class FloodHuntPage {
  readonly openingId = input.required<OpeningId>();
  readonly suctionGroupId = input.required<SuctionGroupId>();
  /** The sequence and step that sent here, and the units that it is read in. */
  readonly back = input<string>();
  readonly step = input<string>();
  readonly units = input<string>();

  private readonly api = inject(FloodHuntApi);
  private readonly session = inject(Session);
  protected readonly online = inject(Connectivity).online;

  protected readonly caution = CAUTION;

  protected readonly list = resource({
    params: () => ({ opening: this.openingId(), group: this.suctionGroupId() }),
    loader: ({ params }) => this.api.read(params.opening, params.group),
  });
  protected readonly hunt = lastRead<FloodHunt>(this.list);
  protected readonly ranked = computed(() => rankCoils(this.hunt()?.coils ?? []));
  protected readonly suspects = computed(() => this.ranked().filter(({ reasons }) => reasons.length > 0));
  protected readonly others = computed(() => this.ranked().filter(({ reasons }) => reasons.length === 0));
  protected readonly groups = computed(() => [
    { name: 'suspects', ranked: this.suspects() },
    { name: 'others', ranked: this.others() },
  ]);
  protected readonly unitSystem = computed((): OpeningDetail['unitSystem'] =>
    this.units() === 'si' ? 'si' : 'us',
  );
  private readonly mayReview = computed(() => this.session.may('review.read', this.openingId()));

  /** A lead looks at a step in its review, an installer on its own sheet. */
  protected linkTo(sequenceId: string): readonly string[] {
    return [this.mayReview() ? '/review' : '/work', sequenceId];
  }

  protected paramsFor(stepKey: string | undefined): Record<string, string> {
    return stepKey === undefined ? {} : { [this.mayReview() ? 'step' : 'at']: stepKey };
  }

  /** Several coils of one fixture are told apart by their numbers. */
  protected hasTwin({ fixtureTag, circuitCode, coilId }: FloodHuntRow): boolean {
    return this.ranked().some(
      ({ coil }) =>
        coil.coilId !== coilId && coil.fixtureTag === fixtureTag && coil.circuitCode === circuitCode,
    );
  }
}
