import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { TranslocoPipe } from '@jsverse/transloco';
import type { Judgement } from '#shared/checklist/judgement';
import type { Step } from '#shared/checklist/step';
import type { SequenceDetail } from '#shared/contracts/sequences';

/** From a return gas that is too low to the list of fixtures that may send the liquid; nothing on any other step. */
@Component({
  selector: 'app-flood-link',
  imports: [RouterLink, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (groupPath(); as path) {
      <a [routerLink]="path" [queryParams]="{ back: sequence().id, step: step().key, units: units() }">{{
        'ui.floodHunt' | transloco
      }}</a>
    }
  `,
  styles: `
    a {
      display: inline-flex;
      align-items: center;
      min-height: 48px;
      color: var(--app-frost);
      font-weight: 600;
    }
  `,
})
export class FloodLink {
  readonly sequence = input.required<SequenceDetail>();
  readonly step = input.required<Step>();
  readonly judgement = input.required<Judgement | null>();

  protected readonly units = computed(() => this.sequence().stepList.facts.unitSystem);
  protected readonly groupPath = computed(() => {
    const step = this.step();
    const { openingId, specification } = this.sequence();
    const isReturnGas = step.kind === 'measurement' && step.method === 'returnGas';
    if (!isReturnGas || !specification.suctionGroup || this.judgement()?.side !== 'low') return null;
    return ['/openings', openingId, 'suction-groups', specification.suctionGroup.id];
  });
}
