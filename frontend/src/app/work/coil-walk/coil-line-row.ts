import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import type { UnitSystem } from '#shared/units/unit-system';
import { OutcomeMark } from '../../ui/outcome-mark/outcome-mark';
import { QuantityOf } from '../../ui/quantity-of';
import { TextOf } from '../../ui/text-of';
import { readingLanguage } from '../../ui/words/reading-language';
import { turnArrow, turnSign } from '../steps/turn-text';
import { countdownText, timeOfDay } from './clock-text';
import type { CoilRow } from './coil-rows';

/** One coil on the walk: where it stands, what was found, turned and left, and the wait of its valve. */
@Component({
  selector: 'app-coil-line-row',
  imports: [OutcomeMark, QuantityOf, TextOf, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @let coil = row();
    <svg viewBox="0 0 40 40" width="40" height="40" [class]="coil.state" aria-hidden="true" focusable="false">
      <path d="M0 6h30a5 5 0 0 1 0 9.500H10a5 5 0 0 0 0 9.500h20a5 5 0 0 1 0 9.500H6" />
    </svg>
    <span class="name">
      @if (coil.number !== null) {
        {{ 'work.coilNumber' | transloco: { number: coil.number } }}
      } @else {
        {{ coil.title | appText }}
      }
    </span>
    <span class="state">
      @if (coil.wait && !coil.wait.isOver) {
        <span class="waits"
          ><span class="heard-only">{{ 'work.waitLeft' | transloco }}</span
          ><strong class="figures">{{ left() }}</strong></span
        >
      }
      @if (coil.state === 'done') {
        <app-outcome-mark
          [outcome]="coil.view.fold?.outcome ?? 'recorded'"
          [side]="coil.view.current?.server?.judgement?.side ?? null"
        />
      } @else if (coil.state === 'askedAgain') {
        <span class="again">{{ 'work.askedAgain' | transloco }}</span>
      } @else if (coil.state !== 'waiting') {
        <span [class]="coil.state">{{ 'work.coilState_' + coil.state | transloco }}</span>
      }
      @if (coil.isStale && coil.state !== 'stale') {
        <span class="stale">{{ 'work.staleMark' | transloco }}</span>
      }
    </span>
    <span class="figures values">
      <span
        ><small>{{ 'work.coilFound' | transloco }}</small>
        {{
          coil.asFoundK === null ? '—' : (coil.asFoundK | appQuantity: 'temperatureDifference' : unitSystem())
        }}</span
      >
      <span
        ><small>{{ 'work.coilTurns' | transloco }}</small>
        @if (turned(); as text) {
          <span class="turn">{{ text }}</span>
          <span class="heard-only">{{ 'work.way_' + coil.turns.at(-1)!.direction | transloco }}</span>
        } @else {
          —
        }
      </span>
      <span
        ><small>{{ 'work.coilLeft' | transloco }}</small>
        <span [class.old]="coil.state === 'stale'">{{
          coil.asLeftK === null ? '—' : (coil.asLeftK | appQuantity: 'temperatureDifference' : unitSystem())
        }}</span></span
      >
    </span>
  `,
  styleUrl: './coil-line-row.scss',
})
export class CoilLineRow {
  readonly row = input.required<CoilRow>();
  readonly unitSystem = input.required<UnitSystem>();

  private readonly language = readingLanguage();
  protected readonly left = computed(() => countdownText(this.row().wait?.remainingS ?? 0));
  /** The last turn, with its way and its time: "½ ↻ 9:12 AM". */
  protected readonly turned = computed(() => {
    const last = this.row().turns.at(-1);
    if (!last) return null;
    const language = this.language();
    return `${turnSign(last.turns, language)} ${turnArrow(last)} ${timeOfDay(last.at, language)}`;
  });
}
