import { computed, inject, Injectable, linkedSignal, signal } from '@angular/core';
import { TranslocoService } from '@jsverse/transloco';
import type { NewRefrigerantTable } from '#shared/contracts/refrigerants';
import { findRefrigerant } from '#shared/refrigeration/saturation/refrigerants';
import { usualDesignation } from '#shared/refrigeration/saturation/designation';
import type { SafetyClass } from '#shared/refrigeration/saturation/saturation-table';
import type { UnitId } from '#shared/units/unit';
import { readingLanguage } from '../ui/words/reading-language';
import { isDesignation, isPure, NAME_CODES, readSheet, type SheetFigures } from './sheet-reading';
import { problemInWords, readingInWords, type SaidProblem, type Say } from './sheet-words';

/** A sheet while it is being entered: what is typed, what it comes to, what has been confirmed. */
@Injectable()
export class SheetDraft {
  private readonly words = inject(TranslocoService);
  private readonly language = readingLanguage();

  readonly text = signal('');
  readonly temperatureUnit = signal<UnitId>('degF');
  readonly pressureUnit = signal<UnitId>('psig');
  readonly designation = signal('');
  readonly issuer = signal('');
  readonly edition = signal('');
  /** Nobody's until somebody chooses: a class that was only left standing would say that nothing burns. */
  readonly safetyClass = signal<SafetyClass | null>(null);
  /** Faults of fields are named from the first try on, not while somebody is still typing. */
  readonly isTried = signal(false);

  readonly reading = computed(() =>
    readSheet(
      this.text(),
      { temperature: this.temperatureUnit(), pressure: this.pressureUnit() },
      { designation: this.designation(), issuer: this.issuer(), edition: this.edition() },
    ),
  );
  readonly figures = computed((): SheetFigures | null => {
    const reading = this.reading();
    return reading.kind === 'figures' ? reading : null;
  });

  /** As checklists write it, where that is another way than it was typed. */
  readonly usual = computed(() => {
    const usual = usualDesignation(this.designation());
    return usual !== '' && usual !== this.designation().trim() ? usual : null;
  });
  /** The program's own figures that the sheet would take precedence over. */
  readonly own = computed(() => findRefrigerant(this.designation())?.designation ?? null);
  readonly isDesignationWrong = computed(() => !isDesignation(this.designation()));
  readonly isIssuerWrong = computed(() => this.issuer().trim() === '');

  /** What has to be put right, by line. */
  readonly refusals = computed((): readonly SaidProblem[] => {
    const reading = this.reading();
    const say = this.say();
    if (reading.kind === 'unreadable') return reading.problems.map((one) => readingInWords(one, say));
    if (reading.kind !== 'tooManyRows') return this.said('refuse');
    const sentence = say('refrigerants.tooManyRows', { count: reading.rowCount });
    return [{ id: reading.kind, line: null, sentence }];
  });
  /** What may stand so in the sheet, when somebody has looked. */
  readonly questions = computed(() => this.said('ask'));
  /** Rows that something is said about, counted from 1. */
  readonly named = computed(
    (): ReadonlySet<number> =>
      new Set(this.figures()?.problems.flatMap(({ row }) => (row === null ? [] : [row])) ?? []),
  );

  /** Other figures are another look at the sheet; what was confirmed of the names doesn't count for them either. */
  private readonly confirmed = linkedSignal<string, ReadonlySet<string>>({
    source: computed(() =>
      [this.text(), this.temperatureUnit(), this.pressureUnit(), this.designation()].join('\n'),
    ),
    computation: () => new Set(),
  });

  /** What still keeps the sheet from being saved, or null. */
  readonly blocked = computed(() => {
    if (this.isDesignationWrong() || this.isIssuerWrong()) return 'names';
    if (this.safetyClass() === null) return 'safetyClass';
    if (this.reading().kind === 'empty') return 'noFigures';
    if (this.refusals().length > 0) return 'refusals';
    return this.questions().every(({ id }) => this.isConfirmed(id)) ? null : 'questions';
  });

  isConfirmed(id: string): boolean {
    return this.confirmed().has(id);
  }

  confirm(id: string, isConfirmed: boolean): void {
    const others = [...this.confirmed()].filter((one) => one !== id);
    this.confirmed.set(new Set(isConfirmed ? [...others, id] : others));
  }

  /** What is sent; null while something is in the way. */
  request(): NewRefrigerantTable | null {
    const figures = this.figures();
    const safetyClass = this.safetyClass();
    if (!figures || safetyClass === null || this.blocked() !== null) return null;
    return { ...figures.table, safetyClass, confirmed: figures.problems.length > 0 };
  }

  private readonly say = computed((): Say => {
    const language = this.language();
    return (key, parameters) => this.words.translate(key, parameters, language);
  });

  private said(severity: 'refuse' | 'ask'): readonly SaidProblem[] {
    const figures = this.figures();
    if (!figures) return [];
    const { units, lines, table, problems } = figures;
    const scene = { units, lines, isPure: isPure(table), language: this.language() };
    return problems
      .filter((problem) => problem.severity === severity && !NAME_CODES.has(problem.code))
      .map((problem) => problemInWords(problem, scene, this.say()));
  }
}
