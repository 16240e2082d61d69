import { ChangeDetectionStrategy, Component, inject, input, signal, type OnInit } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { TranslocoDirective } from '@jsverse/transloco';
import { LONGEST_DESIGNATION } from '#shared/contracts/refrigerants';
import { SAFETY_CLASSES } from '#shared/refrigeration/saturation/saturation-table';
import { UNITS, type UnitId } from '#shared/units/unit';
import { Connectivity } from '../offline/connectivity';
import { Session } from '../session/session';
import { EmptyNote } from '../ui/notes/empty-note';
import { OfflineNote } from '../ui/notes/offline-note';
import { ProblemNote } from '../ui/notes/problem-note';
import { countedKey } from '../ui/words/counted';
import { CheckTable } from './check-table';
import { RefrigerantsApi } from './refrigerants-api';
import { SheetCurve } from './sheet-curve';
import { SheetDraft } from './sheet-draft';
import { readSheetFile } from './sheet-file';
import { SHEET_PRESSURES, SHEET_TEMPERATURES } from './sheet-units';

/** Takes a refrigerant maker's table in: whose sheet it is, its figures, what is odd about them, and the curve. */
@Component({
  selector: 'app-new-table-page',
  imports: [
    CheckTable,
    EmptyNote,
    MatButton,
    OfflineNote,
    ProblemNote,
    RouterLink,
    SheetCurve,
    TranslocoDirective,
  ],
  providers: [SheetDraft],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './new-table-page.html',
  styleUrl: './new-table-page.scss',
})
export class NewTablePage implements OnInit {
  /** From the address: what a refused schedule named. */
  readonly designation = input<string>();

  private readonly api = inject(RefrigerantsApi);
  private readonly router = inject(Router);
  private readonly session = inject(Session);
  protected readonly draft = inject(SheetDraft);
  protected readonly online = inject(Connectivity).online;
  protected readonly countedKey = countedKey;

  protected readonly temperatures = SHEET_TEMPERATURES;
  protected readonly pressures = SHEET_PRESSURES;
  protected readonly safetyClasses = SAFETY_CLASSES;
  protected readonly mostCharacters = LONGEST_DESIGNATION;
  protected readonly mayAdd = (): boolean => this.session.may('refrigerant.add');
  protected readonly fileFault = signal<'empty' | 'tooLarge' | 'notText' | null>(null);
  protected readonly isSending = signal(false);
  protected readonly problem = signal<unknown>(null);

  ngOnInit(): void {
    this.draft.designation.set(this.designation()?.slice(0, LONGEST_DESIGNATION) ?? '');
  }

  protected symbol(unit: UnitId): string {
    return UNITS[unit].symbol;
  }

  protected async choose(box: HTMLInputElement): Promise<void> {
    const file = box.files?.[0];
    // So that the same file, corrected, can be chosen again.
    box.value = '';
    if (!file) return;
    const read = await readSheetFile(file);
    this.fileFault.set(read.ok ? null : read.fault);
    if (read.ok) this.draft.text.set(read.text);
  }

  protected async save(): Promise<void> {
    this.draft.isTried.set(true);
    const request = this.draft.request();
    if (!request || this.isSending()) return;
    this.isSending.set(true);
    this.problem.set(null);
    try {
      await this.api.add(request);
      await this.router.navigate(['/refrigerants']);
    } catch (error) {
      this.problem.set(error);
    } finally {
      this.isSending.set(false);
    }
  }
}
