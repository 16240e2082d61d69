import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import {
  NonNullableFormBuilder,
  ReactiveFormsModule,
  Validators,
  type AbstractControl,
} from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { TranslocoDirective } from '@jsverse/transloco';
import { LANGUAGES } from '#shared/checklist/text';
import { UNIT_SYSTEMS } from '#shared/plant/plant';
import { UNITS } from '#shared/units/unit';
import { displayUnit } from '#shared/units/unit-system';
import { Connectivity } from '../offline/connectivity';
import { OfflineNote } from '../ui/notes/offline-note';
import { ProblemNote } from '../ui/notes/problem-note';
import { QuantityOf } from '../ui/quantity-of';
import { readingLanguage } from '../ui/words/reading-language';
import { isTimeZone, readElevation, toNewOpening } from './new-opening';
import { OpeningsApi } from './openings-api';

const ownZone = (): string => Intl.DateTimeFormat().resolvedOptions().timeZone;

/** A new opening: what the store is, where it stands and how its people read. */
@Component({
  selector: 'app-new-opening-page',
  imports: [
    MatButton,
    OfflineNote,
    ProblemNote,
    QuantityOf,
    ReactiveFormsModule,
    RouterLink,
    TranslocoDirective,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './new-opening-page.html',
  styleUrl: './new-opening-page.scss',
})
export class NewOpeningPage {
  private readonly api = inject(OpeningsApi);
  private readonly router = inject(Router);
  protected readonly online = inject(Connectivity).online;

  protected readonly unitSystems = UNIT_SYSTEMS;
  protected readonly languages = LANGUAGES;
  protected readonly zones: readonly string[] = Intl.supportedValuesOf('timeZone');
  protected readonly form = inject(NonNullableFormBuilder).group({
    name: ['', [Validators.required, Validators.maxLength(120)]],
    address: ['', Validators.maxLength(300)],
    unitSystem: UNIT_SYSTEMS[0] as (typeof UNIT_SYSTEMS)[number],
    elevation: ['', Validators.required],
    openingDate: ['', Validators.required],
    timeZone: [
      ownZone(),
      [(control: AbstractControl<string>) => (isTimeZone(control.value) ? null : { zone: true })],
    ],
    contractorName: ['', Validators.maxLength(120)],
    language: readingLanguage()(),
  });
  private readonly typed = toSignal(this.form.valueChanges, { initialValue: this.form.value });

  protected readonly elevation = computed(() =>
    readElevation(this.typed().elevation ?? '', this.typed().unitSystem ?? 'us'),
  );
  protected readonly unitSystem = computed(() => this.typed().unitSystem ?? 'us');
  protected readonly elevationUnit = computed(() => UNITS[displayUnit('length', this.unitSystem())].symbol);
  protected readonly isSending = signal(false);
  protected readonly problem = signal<unknown>(null);
  /** Faults are named from the first try on, not while somebody is still typing. */
  protected readonly isTried = signal(false);

  protected async create(): Promise<void> {
    this.isTried.set(true);
    const request = toNewOpening(this.form.getRawValue());
    if (!request || this.form.invalid || this.isSending()) {
      this.form.markAllAsTouched();
      return;
    }
    this.isSending.set(true);
    this.problem.set(null);
    try {
      const opening = await this.api.create(request);
      await this.router.navigate(['/openings', opening.id]);
    } catch (error) {
      this.problem.set(error);
    } finally {
      this.isSending.set(false);
    }
  }

  /** Whether a field's fault is to be shown now. */
  protected isWrong(name: 'name' | 'openingDate' | 'timeZone'): boolean {
    this.typed();
    const control = this.form.controls[name];
    return control.invalid && (this.isTried() || (control.touched && control.dirty));
  }
}
