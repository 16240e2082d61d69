import { ChangeDetectionStrategy, Component, effect, inject, signal } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import type { Signature } from '#shared/checklist/signature';
import { Connectivity } from '../../offline/connectivity';
import { SignatureBox } from '../../ui/signature/signature-box';
import { TextOf } from '../../ui/text-of';
import { StepDraft } from './step-draft';

/** A name under the work. A signature isn't kept as a draft: it is given in one go or not at all. */
@Component({
  selector: 'app-signature-step',
  imports: [SignatureBox, TextOf, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <app-signature-box [meaning]="step.meaning | appText" [printedName]="name" [(signature)]="signature" />
    @if (!online()) {
      <p>{{ 'work.signedOffline' | transloco }}</p>
    }
  `,
  styles: 'p { margin-top: var(--app-space-3); color: var(--app-ink-soft); font-size: var(--app-size-1); }',
})
export class SignatureStep {
  private readonly draft = inject(StepDraft);
  protected readonly online = inject(Connectivity).online;
  protected readonly step = this.draft.stepOf('signature');
  protected readonly name = this.draft.current.personName;
  protected readonly signature = signal<Signature | null>(null);

  constructor() {
    effect(() => {
      const signature = this.signature();
      this.draft.propose(signature && { kind: 'signature', signature }, 'signature');
    });
  }
}
