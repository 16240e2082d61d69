import { ChangeDetectionStrategy, Component, computed, inject, resource, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { TranslocoDirective } from '@jsverse/transloco';
import { saturationOf } from '#shared/checklist/saturation-of';
import type { RefrigerantTable } from '#shared/contracts/refrigerants';
import { UNIT_SYSTEMS } from '#shared/plant/plant';
import { findRefrigerant } from '#shared/refrigeration/saturation/refrigerants';
import { formatQuantity } from '#shared/units/format';
import type { UnitSystem } from '#shared/units/unit-system';
import { Connectivity } from '../offline/connectivity';
import { Session } from '../session/session';
import { DateTimeOf } from '../ui/date-time-of';
import { EmptyNote } from '../ui/notes/empty-note';
import { LoadingNote } from '../ui/notes/loading-note';
import { OfflineNote } from '../ui/notes/offline-note';
import { ProblemNote } from '../ui/notes/problem-note';
import { lastRead } from '../ui/pages/last-read';
import { readingLanguage } from '../ui/words/reading-language';
import { CheckTable } from './check-table';
import { RefrigerantsApi } from './refrigerants-api';
import { SheetCurve } from './sheet-curve';
import { UNITS_OF_SYSTEM } from './sheet-units';

/** The makers' tables that the company works with, and those that newer ones took the place of. */
@Component({
  selector: 'app-refrigerants-page',
  imports: [
    CheckTable,
    DateTimeOf,
    EmptyNote,
    LoadingNote,
    MatButton,
    OfflineNote,
    ProblemNote,
    RouterLink,
    SheetCurve,
    TranslocoDirective,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './refrigerants-page.html',
  styleUrl: './refrigerants-page.scss',
})
export class RefrigerantsPage {
  private readonly api = inject(RefrigerantsApi);
  private readonly session = inject(Session);
  private readonly language = readingLanguage();
  protected readonly online = inject(Connectivity).online;

  protected readonly list = resource({ loader: () => this.api.tables() });
  protected readonly read = lastRead(this.list);
  protected readonly mayAdd = computed(() => this.session.may('refrigerant.add'));
  protected readonly unitSystems = UNIT_SYSTEMS;
  protected readonly unitSystem = signal<UnitSystem>('us');
  protected readonly units = computed(() => UNITS_OF_SYSTEM[this.unitSystem()]);
  protected readonly openId = signal<string | null>(null);
  protected readonly rows = computed(() => this.read()?.items.map((table) => this.rowOf(table)) ?? []);

  protected toggle(id: string): void {
    this.openId.set(this.openId() === id ? null : id);
  }

  private rowOf(table: RefrigerantTable) {
    const temperature = (si: number | undefined): string =>
      formatQuantity(si ?? NaN, this.units().temperature, this.language());
    return {
      table,
      /** The program has figures of its own, over which the sheet takes precedence. */
      hasOwn: findRefrigerant(table.designation) !== undefined,
      coldest: temperature(table.points[0]?.temperatureK),
      warmest: temperature(table.points.at(-1)?.temperatureK),
    };
  }

  /** Worked out only for the one that is looked at. */
  protected readonly opened = computed(() => {
    const table = this.read()?.items.find(({ id }) => id === this.openId());
    if (!table) return null;
    const saturation = saturationOf({ refrigerant: table.designation, makersTable: table });
    return { table, saturation: saturation ?? null };
  });
}
