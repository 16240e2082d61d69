import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { TranslocoPipe, TranslocoService } from '@jsverse/transloco';
import type { TrendAnswer } from '#shared/checklist/kinds/trend';
import { formatQuantity } from '#shared/units/format';
import { TextOf } from '../../ui/text-of';
import { TrendView } from '../../ui/trend-chart/trend-view';
import { readingLanguage } from '../../ui/words/reading-language';
import { NOW_MS } from '../coil-walk/phone-clock';
import type { PickedLog, WantedColumn } from '../logger/log-choice';
import { LoggerPicker } from '../logger/logger-picker';
import { LiveJudgement } from './live-judgement';
import { StepDraft } from './step-draft';
import { endsInFuture, trendAnswerOf, WHOLE, type Fitting } from './trend-step-answer';
import { WantedLimits } from './wanted-limits';

const DAY_S = 86_400;

/** The log in the making: what a file gave is kept, since the file itself is gone when the page closes. */
interface TypedTrend {
  readonly answer: TrendAnswer | null;
  readonly fitting: Fitting;
}

/** The log of a fixture's temperatures: out of a data logger's file, drawn and judged before it is recorded. */
@Component({
  selector: 'app-trend-step',
  imports: [LiveJudgement, LoggerPicker, TextOf, TranslocoPipe, TrendView, WantedLimits],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './trend-step.html',
  styleUrl: './segments.scss',
})
export class TrendStep {
  private readonly temperature = toSignal(
    inject(TranslocoService).selectTranslate<string>('work.trend_temperature'),
    { initialValue: '' },
  );
  private readonly language = readingLanguage();
  private readonly nowMs = inject(NOW_MS);
  protected readonly draft = inject(StepDraft);
  protected readonly step = this.draft.stepOf('trend');
  protected readonly typed = this.draft.form<TypedTrend>({
    answer: this.draft.previousOf('trend'),
    fitting: WHOLE,
  });
  protected readonly answer = computed(() => this.typed().answer);
  /** Days that the recorded samples span. */
  protected readonly days = computed(() => {
    const { atS = [] } = this.answer() ?? {};
    return Math.round(((atS.at(-1) ?? 0) - (atS[0] ?? 0)) / DAY_S);
  });
  protected readonly wanted = computed((): readonly WantedColumn[] => [
    { key: 'temperature', label: this.temperature(), dimension: 'temperature' },
  ]);

  constructor() {
    effect(() => {
      const answer = this.answer();
      // A log of tomorrow proves nothing about today.
      const isEarly = answer !== null && endsInFuture(answer, this.nowMs());
      this.draft.propose(isEarly ? null : answer, isEarly ? 'logInFuture' : 'log');
    });
  }

  protected take(log: PickedLog | null): void {
    this.typed.set(log ? trendAnswerOf(log, this.step) : { answer: null, fitting: WHOLE });
  }

  /** A time that the step asks for: whole hours as such. */
  protected time(seconds: number): string {
    return formatQuantity(seconds, seconds >= 3600 ? 'h' : 'min', this.language());
  }
}
