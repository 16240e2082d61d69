import type { ElementRef } from '@angular/core';
import { ChangeDetectionStrategy, Component, computed, input, output, viewChild } from '@angular/core';
import { TranslocoDirective } from '@jsverse/transloco';
import type { SequenceDetail } from '#shared/contracts/sequences';
import { AnswerView, type PhotoUrl } from '../ui/answer-view/answer-view';
import { DateTimeOf } from '../ui/date-time-of';
import { FloodLink } from '../ui/flood-link/flood-link';
import { TextOf } from '../ui/text-of';
import { Unbroken } from '../ui/words/unbroken';
import { reasonsBesideOutcome, type ReviewStep } from './attention-order';
import { EntryLine } from './entry-line';
import { photosNotWell } from './photo-states';

const MOST_CHARACTERS = 2000;

/** The evidence of one step: what was recorded, by whom and when, all that was recorded before, and the remark on it. */
@Component({
  selector: 'app-step-evidence',
  imports: [AnswerView, DateTimeOf, EntryLine, FloodLink, TextOf, TranslocoDirective, Unbroken],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './step-evidence.html',
  styleUrl: './step-evidence.scss',
})
export class StepEvidence {
  readonly item = input.required<ReviewStep>();
  readonly sequence = input.required<SequenceDetail>();
  readonly photoUrl = input.required<PhotoUrl>();
  readonly remark = input.required<string>();
  /** Whether remarks can be written: the sequence is under review, by somebody who may review it. */
  readonly canRemark = input.required<boolean>();
  readonly remarkTyped = output<string>();
  /** The writer turns away from the remark; it stays as it is. */
  readonly remarkLeft = output<void>();
  readonly openPhoto = output<number>();

  private readonly box = viewChild<ElementRef<HTMLTextAreaElement>>('box');

  protected readonly most = MOST_CHARACTERS;
  protected readonly step = computed(() => this.item().view.step);
  /** The answer below says itself whether it lies outside. */
  protected readonly reasons = computed(() => reasonsBesideOutcome(this.item().reasons));
  protected readonly section = computed(
    () => this.sequence().stepList.sections.find(({ key }) => key === this.step().section)?.title ?? null,
  );
  protected readonly unitSystem = computed(() => this.sequence().stepList.facts.unitSystem);
  protected readonly photosNotWell = computed(() =>
    photosNotWell(this.item().view.current, this.sequence().photos),
  );
  /** What was recorded before the current entry, the latest first. */
  protected readonly earlier = computed(() => this.item().view.history.slice(0, -1).reverse());
  /** Remarks that earlier rounds made on this step, the latest first. */
  protected readonly earlierRemarks = computed(() =>
    this.sequence()
      .entries.flatMap(({ body, server }) =>
        body.content.kind === 'review'
          ? body.content.remarks
              .filter(({ stepKey }) => stepKey === this.step().key)
              .map(({ text }) => ({ text, by: this.nameOf(body.authorId), at: server.receivedAt }))
          : [],
      )
      .reverse(),
  );

  /** Puts the cursor into the remark box. */
  writeRemark(): void {
    this.box()?.nativeElement.focus();
  }

  private nameOf(id: string): string {
    return this.sequence().people.find((person) => person.id === id)?.name ?? '–';
  }
}
