import { ChangeDetectionStrategy, Component, computed, inject, model, signal } from '@angular/core';
import { TranslocoPipe, TranslocoService } from '@jsverse/transloco';
import { readingLanguage } from '../../ui/words/reading-language';
import type { PickedLog, WantedColumn } from '../logger/log-choice';
import { LoggerPicker } from '../logger/logger-picker';
import type { TakenLog } from './superheat-typed';
import { LOG_COLUMNS, takenLog } from './taken-log';

/** A data logger's file with the pressure at the coil and the line temperature in it. */
@Component({
  selector: 'app-superheat-log',
  imports: [LoggerPicker, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    @if (log(); as taken) {
      <p>
        {{ 'work.logTaken' | transloco: { name: name(), count: taken.atS.length, minutes: minutes() } }}
      </p>
    }
    @if (isCut()) {
      <p class="soft">{{ 'work.logCut' | transloco: { count: log()?.atS?.length } }}</p>
    }
    <app-logger-picker [wanted]="wanted()" [hasBefore]="log() !== null" (picked)="take($event)" />
  `,
  styleUrl: './segments.scss',
})
export class SuperheatLog {
  readonly log = model.required<TakenLog | null>();

  private readonly words = inject(TranslocoService);
  private readonly language = readingLanguage();
  protected readonly isCut = signal(false);
  protected readonly wanted = computed((): readonly WantedColumn[] => {
    const say = (key: string): string => this.words.translate(key, {}, this.language());
    return [
      { key: LOG_COLUMNS.pressure, label: say('work.suctionPressure'), dimension: 'gaugePressure' },
      { key: LOG_COLUMNS.temperature, label: say('work.lineTemperature'), dimension: 'temperature' },
    ];
  });
  protected readonly name = computed(() => this.log()?.file.name ?? '');
  protected readonly minutes = computed(() => Math.round((this.log()?.atS.at(-1) ?? 0) / 60));

  protected take(picked: PickedLog | null): void {
    const taken = picked && takenLog(picked);
    this.isCut.set(taken?.isCut ?? false);
    this.log.set(taken?.log ?? null);
  }
}
