import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  output,
  signal,
  viewChild,
  type ElementRef,
} from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { TranslocoPipe } from '@jsverse/transloco';
import { DomainFailure } from '#shared/failures/failure';
import type { SequenceView } from '#shared/sequences/sequence-view';
import { QuantityOf } from '../../ui/quantity-of';
import { TextOf } from '../../ui/text-of';
import { WantedLimits } from '../steps/wanted-limits';
import { outsideRow, reasonMissing } from './submit-summary';
import { SequenceStore } from './sequence-store';

/** A look over the whole before it goes to a lead: what is missing, what stands, what lies outside. */
@Component({
  selector: 'app-submit-sheet',
  imports: [MatButtonModule, QuantityOf, RouterLink, TextOf, TranslocoPipe, WantedLimits],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './submit-sheet.html',
  styleUrl: './submit-sheet.scss',
})
export class SubmitSheet {
  readonly view = input.required<SequenceView>();
  readonly pick = output<string>();

  private readonly store = inject(SequenceStore);
  private readonly heading = viewChild.required<ElementRef<HTMLElement>>('heading');
  protected readonly isBusy = signal(false);
  protected readonly hasFailed = signal(false);
  protected readonly unsent = this.store.unsentCount;
  protected readonly unitSystem = computed(() => this.store.detail()?.stepList.facts.unitSystem ?? 'si');
  protected readonly state = computed(() => this.view().fold.state);
  protected readonly isPending = computed(() => this.view().fold.pending.length > 0);
  protected readonly missing = computed(() =>
    this.view().missing.map((step) => ({ step, reason: reasonMissing(this.view(), step.key) })),
  );
  protected readonly outside = computed(() =>
    this.view()
      .steps.filter(({ fold }) => fold?.outcome === 'outside')
      .map(outsideRow),
  );
  protected readonly notApplicable = computed(
    () => this.view().steps.filter(({ fold }) => fold?.outcome === 'notApplicable').length,
  );
  protected readonly canSubmit = computed(
    () =>
      (this.state() === 'open' || this.state() === 'sentBack') &&
      this.missing().length === 0 &&
      // One that waits for what never comes can be given again: it takes the place of the first.
      !(this.isPending() && this.unsent() > 0),
  );

  constructor() {
    afterNextRender(() => this.heading().nativeElement.focus({ preventScroll: true }));
  }

  protected async submit(): Promise<void> {
    this.isBusy.set(true);
    this.hasFailed.set(false);
    try {
      await this.store.submit();
    } catch (error) {
      // Only the phone's own store, or a phone that was never registered, can stand in the way.
      if (!(error instanceof DOMException) && !(error instanceof DomainFailure)) throw error;
      this.hasFailed.set(true);
    } finally {
      this.isBusy.set(false);
    }
  }
}
