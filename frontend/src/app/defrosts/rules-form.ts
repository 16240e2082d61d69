import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { TranslocoDirective } from '@jsverse/transloco';
import type { DefrostPlanRequest } from '#shared/contracts/defrost-plans';
import { clockText } from '#shared/contracts/defrost-words';
import { USUAL_DEFROST_RULES } from '#shared/refrigeration/defrost/defrost-plan-types';
import { formatQuantity } from '#shared/units/format';
import type { UnitId } from '#shared/units/unit';
import { displayUnit, type UnitSystem } from '#shared/units/unit-system';
import { readingLanguage } from '../ui/words/reading-language';
import type { FieldFault } from './circuit-panel';
import { NumberField } from './number-field';

type Rules = DefrostPlanRequest['rules'];
type QuietHours = Rules['quietHours'][number];

const MOST_QUIET = 6;
const ONE_NIGHT: QuietHours = { fromS: 17 * 3600, toS: 19 * 3600 };

/** The rules that a plan has to obey; what isn't common practice is empty until somebody fills it in. */
@Component({
  selector: 'app-rules-form',
  imports: [MatButton, NumberField, TranslocoDirective],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './rules-form.html',
  styleUrl: './rules-form.scss',
})
export class RulesForm {
  readonly rules = input.required<Rules>();
  readonly unitSystem = input.required<UnitSystem>();
  readonly isEditable = input(false);
  readonly changed = output<Partial<Rules>>();
  readonly fault = output<FieldFault>();

  private readonly language = readingLanguage();
  protected readonly usual = USUAL_DEFROST_RULES;
  protected readonly loadUnit = computed((): UnitId => displayUnit('heatFlow', this.unitSystem()));
  protected readonly mayAdd = computed(() => this.rules().quietHours.length < MOST_QUIET);
  protected readonly clock = clockText;
  protected readonly mostGapS = 12 * 3600;

  protected percent(fraction: number): string {
    return formatQuantity(fraction, 'percent', this.language());
  }

  protected minutes(seconds: number): string {
    return formatQuantity(seconds, 'min', this.language());
  }

  /** A needed figure is never emptied: the field says so itself. */
  protected set(field: keyof Rules, value: number | null): void {
    this.changed.emit({ [field]: value });
  }

  protected note(field: keyof Rules, isFaulty: boolean): void {
    this.fault.emit({ field, isFaulty });
  }

  protected add(): void {
    this.changed.emit({ quietHours: [...this.rules().quietHours, ONE_NIGHT] });
  }

  protected remove(index: number): void {
    this.changed.emit({ quietHours: this.rules().quietHours.filter((_, at) => at !== index) });
  }

  protected setQuiet(index: number, end: keyof QuietHours, text: string): void {
    const [hours, minutes] = text.split(':').map(Number);
    if (hours === undefined || minutes === undefined || !Number.isFinite(hours + minutes)) return;
    const changed = { ...(this.rules().quietHours[index] ?? ONE_NIGHT), [end]: hours * 3600 + minutes * 60 };
    this.changed.emit({ quietHours: this.rules().quietHours.with(index, changed) });
  }
}
