import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { TranslocoDirective } from '@jsverse/transloco';
import type { HandoverPackage } from '#shared/contracts/packages';
import { DateTimeOf } from '../ui/date-time-of';

/** Where one package stands: its progress while it is built, why it failed, when it was issued, who accepted it. */
@Component({
  selector: 'app-package-state',
  imports: [DateTimeOf, TranslocoDirective],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <ng-container *transloco="let t; prefix: 'packages'">
      @switch (pack().state) {
        @case ('building') {
          <label>
            {{ t('building') }}
            <progress max="1" [value]="pack().progress"></progress>
            <span class="figures">{{ percent() }} %</span>
          </label>
        }
        @case ('failed') {
          <p class="failed">{{ t('failed') }} {{ t('failure_' + (pack().failure ?? 'bug')) }}</p>
        }
        @case ('cancelled') {
          <p class="soft">{{ t('cancelled') }}</p>
        }
        @case ('issued') {
          @if (pack().acceptance; as acceptance) {
            <p class="accepted">
              {{ t('acceptedBy', { name: acceptance.personName }) }}
              <span class="soft">{{ acceptance.signedAt | appDateTime: pack().timeZone }}</span>
            </p>
          } @else {
            <p>
              {{ t('issued') }}
              <span class="soft">{{ pack().issuedAt ?? '' | appDateTime: pack().timeZone }}</span>
            </p>
          }
        }
      }
    </ng-container>
  `,
  styles: `
    label {
      display: flex;
      flex-wrap: wrap;
      gap: var(--app-space-2);
      align-items: center;
    }
    progress {
      flex: 1 1 8rem;
      accent-color: var(--app-copper-line);
    }
    .failed {
      color: var(--app-plum);
    }
    .accepted {
      color: var(--app-copper);
      font-weight: 500;
    }
    .soft {
      color: var(--app-ink-soft);
      font-weight: 400;
    }
  `,
})
export class PackageState {
  readonly pack = input.required<HandoverPackage>();

  protected percent(): number {
    return Math.floor(this.pack().progress * 100);
  }
}
