import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { TranslocoDirective } from '@jsverse/transloco';
import { OutcomeMark } from '../ui/outcome-mark/outcome-mark';
import { TextOf } from '../ui/text-of';
import { Unbroken } from '../ui/words/unbroken';
import type { ReviewOrder } from './attention-order';
import type { Drafts } from './remark-drafts';

/** The reviewer's list of steps: what needs eyes first with the reasons, then the rest in working order. */
@Component({
  selector: 'app-review-steps',
  imports: [OutcomeMark, TextOf, TranslocoDirective, Unbroken],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './review-steps.html',
  styleUrl: './review-steps.scss',
})
export class ReviewSteps {
  readonly order = input.required<ReviewOrder>();
  readonly selected = input.required<string | null>();
  readonly drafts = input.required<Drafts>();
  readonly choose = output<string>();

  protected hasRemark(key: string): boolean {
    return (this.drafts()[key] ?? '').trim() !== '';
  }
}
