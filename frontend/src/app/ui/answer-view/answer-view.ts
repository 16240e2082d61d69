import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { TranslocoDirective } from '@jsverse/transloco';
import type { Step } from '#shared/checklist/step';
import type { FoldEntry } from '#shared/sequences/fold';
import { UNITS } from '#shared/units/unit';
import type { UnitSystem } from '#shared/units/unit-system';
import { OutcomeMark } from '../outcome-mark/outcome-mark';
import { QuantityOf } from '../quantity-of';
import { SignatureView } from '../signature/signature-view';
import { Strip } from '../strip/strip';
import { TextOf } from '../text-of';
import { TrendView } from '../trend-chart/trend-view';
import { JudgedOf } from '../words/judged-words';
import { SourceOf } from '../words/source-of';
import { WorkingSlip } from '../working-slip/working-slip';
import {
  chosenLabel,
  judgedFigure,
  measuredLines,
  otherFigures,
  pairLines,
  type TypedInput,
  typedInputs,
} from './answer-figures';
import { SuperheatExtras } from './superheat-extras';
import { judgedMean } from './superheat-lines';

/** Where a photo's bytes are read from; the thumbnail for the row, the full size for the dialog. */
export type PhotoUrl = (sha256: string, size: 'full' | 'thumbnail') => string;

/**
 * One recorded entry with all that belongs to it: outcome, strip, what was typed, what was worked out and how, photos,
 * signature, doubts. The same for the installer's history and the lead's evidence.
 */
@Component({
  selector: 'app-answer-view',
  imports: [
    JudgedOf,
    TranslocoDirective,
    OutcomeMark,
    QuantityOf,
    SignatureView,
    SourceOf,
    Strip,
    SuperheatExtras,
    TextOf,
    TrendView,
    WorkingSlip,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './answer-view.html',
  styleUrl: './answer-view.scss',
})
export class AnswerView {
  readonly step = input.required<Step>();
  readonly entry = input.required<FoldEntry>();
  readonly unitSystem = input.required<UnitSystem>();
  readonly photoUrl = input.required<PhotoUrl>();
  /** The store's: moments are told as they were on site. */
  readonly timeZone = input<string>();
  /** Whether the working lies open at once; otherwise one tap opens it. */
  readonly openWorking = input(false);
  /** Index of the photo that was asked for at full size. */
  readonly openPhoto = output<number>();

  protected readonly content = computed(() => this.entry().body.content);
  protected readonly answer = computed(() => {
    const content = this.content();
    return content.kind === 'answer' ? content.answer : null;
  });
  protected readonly judgement = computed(() => this.entry().server.judgement);
  protected readonly outcome = computed(() => {
    const content = this.content();
    if (content.kind === 'notApplicable') return 'notApplicable';
    return this.judgement()?.outcome ?? (content.kind === 'answer' ? content.workedOut.outcome : 'recorded');
  });
  protected readonly judged = computed(() => judgedFigure(this.judgement()));
  /** The pairs of a superheat with a saturation each, where there are several; `null` where there is one or none. */
  private readonly pairs = computed(() => pairLines(this.content(), this.judgement()));
  protected readonly figures = computed(() =>
    otherFigures(this.judgement(), this.pairs() !== null).map((figure) => ({
      ...figure,
      dimension: UNITS[figure.unit].dimension,
    })),
  );
  /** Line by line: as it was typed, or, with a `saturationK`, worked out from the line's pair. */
  protected readonly inputs = computed(() => {
    const typed = ({ label, typed: { text, unit } }: TypedInput) => ({
      label,
      text: `${text} ${UNITS[unit].symbol}`.trim(),
      saturationK: null,
    });
    return (
      this.pairs()?.flatMap(({ inputs, label, saturationK }) => [
        ...inputs.map(typed),
        ...(saturationK === null ? [] : [{ label, text: '', saturationK }]),
      ]) ?? typedInputs(this.content()).map(typed)
    );
  });
  /** Which of a superheat's two averages is held against the band. */
  protected readonly judgedMean = computed(() => judgedMean(this.step()));
  protected readonly measured = computed(() => measuredLines(this.content()));
  protected readonly chosen = computed(() => {
    const answer = this.answer();
    return answer?.kind === 'choose' ? chosenLabel(this.step(), answer.value) : null;
  });
}
