import { CdkStepperModule } from '@angular/cdk/stepper';
import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { MatButtonModule } from '@angular/material/button';
import { MatIconModule } from '@angular/material/icon';
import { TranslocoPipe } from '@jsverse/transloco';
import { WantedLimits } from '../steps/wanted-limits';
import type { OutsideValue } from './outside-value';

/** Words with what stands in them. */
/** Why the button is grey: a key of the words, or a sentence that stands in shared code already. */
export type Reason =
  | { readonly key: string; readonly params: Readonly<Record<string, string>>; readonly said?: never }
  | { readonly said: string };

/** The bar in the thumb's reach: a step back, the one action or why it isn't possible yet, a step on. */
@Component({
  selector: 'app-step-footer',
  imports: [CdkStepperModule, MatButtonModule, MatIconModule, TranslocoPipe, WantedLimits],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './step-footer.html',
  styleUrl: './step-footer.scss',
})
export class StepFooter {
  readonly number = input.required<number>();
  readonly count = input.required<number>();
  /** Key of the words on the action. */
  readonly action = input.required<string>();
  readonly hasMain = input(true);
  readonly canAct = input.required<boolean>();
  /** Why the action isn't possible yet. */
  readonly reason = input<Reason | null>(null);
  /** Key of a question that the next tap on the action answers with yes. */
  readonly question = input<string | null>(null);
  /** The value that the question is about, where that is one outside its limits. */
  readonly outside = input<OutsideValue | null>(null);
  /** Key of what went wrong. */
  readonly failure = input<string | null>(null);
  readonly act = output<void>();
  readonly goToReview = output<void>();
}
