import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { TranslocoDirective } from '@jsverse/transloco';
import {
  blockingInWords,
  breachInWords,
  DEFROST_RULE_NAMES,
  noteInWords,
  type DefrostSpeech,
} from '#shared/contracts/defrost-words';
import type { CircuitId, OpeningId } from '#shared/plant/ids';
import type { DefrostBreach } from '#shared/refrigeration/defrost/defrost-breach';
import { startsOf } from '#shared/refrigeration/defrost/defrosts-of-plan';
import { Connectivity } from '../offline/connectivity';
import { Session } from '../session/session';
import { EmptyNote } from '../ui/notes/empty-note';
import { LoadingNote } from '../ui/notes/loading-note';
import { OfflineNote } from '../ui/notes/offline-note';
import { ProblemNote } from '../ui/notes/problem-note';
import { formatMoment } from '../ui/words/dates';
import { countedKey } from '../ui/words/counted';
import { readingLanguage } from '../ui/words/reading-language';
import { CircuitPanel, type FieldFault } from './circuit-panel';
import { DefrostStore } from './defrost-store';
import { NumberField } from './number-field';
import { PlanChart } from './plan-chart';
import { detailsOf, type PlanDraft } from './plan-draft';
import { RulesForm } from './rules-form';

/** The day of defrosts of one opening: laid out by the program, moved by hand, checked at every change, saved. */
@Component({
  selector: 'app-defrost-page',
  imports: [
    CircuitPanel,
    EmptyNote,
    LoadingNote,
    MatButton,
    NumberField,
    OfflineNote,
    PlanChart,
    ProblemNote,
    RouterLink,
    RulesForm,
    TranslocoDirective,
  ],
  providers: [DefrostStore],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './defrost-page.html',
  styleUrl: './defrost-page.scss',
})
export class DefrostPage {
  readonly openingId = input.required<OpeningId>();

  private readonly session = inject(Session);
  protected readonly store = inject(DefrostStore);
  protected readonly online = inject(Connectivity).online;
  protected readonly language = readingLanguage();
  protected readonly countedKey = countedKey;

  protected readonly maySave = computed(() => this.session.may('defrostPlan.save', this.openingId()));
  protected readonly unitSystem = computed(() => this.store.page()?.opening.unitSystem ?? 'us');
  protected readonly savedAt = computed(() => {
    const newest = this.store.newest();
    return newest && formatMoment(newest.createdAt, this.language(), this.store.page()?.opening.timeZone);
  });
  private readonly speech = computed((): DefrostSpeech => {
    const codes = new Map<string, string>(this.store.circuits().map(({ id, code }) => [id, code]));
    return {
      language: this.language(),
      unitSystem: this.unitSystem(),
      rules: { leastRunningLoadForHotGasW: this.store.draft()?.rules.leastRunningLoadForHotGasW ?? null },
      codeOf: (id) => codes.get(id) ?? id,
    };
  });
  protected readonly breaches = computed(() =>
    this.store.breaches().map((breach) => ({
      breach,
      name: DEFROST_RULE_NAMES[breach.rule][this.language()],
      text: breachInWords(breach, this.speech()),
    })),
  );
  protected readonly notes = computed(() =>
    this.store.notes().map((note) => noteInWords(note, this.speech())),
  );
  protected readonly blockedBy = computed(() =>
    (this.store.blocked()?.blockedBy ?? []).map((rule) => blockingInWords(rule, this.speech())),
  );
  protected readonly unplaced = computed(() => this.codes(this.store.blocked()?.unplacedIds ?? []));
  /** Circuits that lack a duration, each asked for where the page begins: without them there is no plan. */
  protected readonly needed = computed(() => {
    const draft = this.store.draft();
    const scheduled = this.store.page()?.circuits ?? [];
    return (draft ? this.askedFor() : []).flatMap((id) => {
      const circuit = scheduled.find((each) => each.id === id);
      return draft && circuit ? [{ circuit, details: detailsOf(draft, circuit.id) }] : [];
    });
  });
  /** A field stays where it is while somebody types into it: once asked for, it is shown to the end. */
  private readonly askedFor = computed(() =>
    (this.store.page()?.circuits ?? [])
      .filter((circuit) => circuit.failSafeS === null && circuit.type !== 'none' && circuit.perDay > 0)
      .map(({ id }) => id),
  );
  protected readonly isPlannable = computed(() => this.store.missing().duration.length === 0);
  protected readonly assumptions = computed(() => ({
    drip: this.codes(this.store.missing().drip),
    load: this.codes(this.store.missing().load),
    heater: this.codes(this.store.missing().heater),
  }));
  protected readonly selected = computed(() => {
    const chosen = this.store.chosen();
    const draft = this.store.draft();
    const scheduled = this.store.page()?.circuits.find(({ id }) => id === chosen?.circuitId);
    const planned = this.store.circuits().find(({ id }) => id === chosen?.circuitId);
    if (!chosen || !draft || !scheduled || !planned) return null;
    const isThere = startsOf(draft.plan, scheduled.id).includes(chosen.startS);
    return {
      scheduled,
      planned,
      details: detailsOf(draft, scheduled.id),
      startS: isThere ? chosen.startS : null,
    };
  });
  protected readonly names = computed(() => {
    const details = this.store.draft()?.details ?? [];
    const all = (values: readonly (string | null)[]): string[] => [
      ...new Set(values.filter((value) => value !== null)),
    ];
    return {
      boxes: all(details.map(({ box }) => box)),
      curtains: all(details.map((each) => each.airCurtain)),
    };
  });

  constructor() {
    effect(() => this.store.open(this.openingId()));
    // A store that nobody has planned yet is laid out at once, by the usual rules.
    effect(() => {
      const page = this.store.page();
      if (!page || page.newest || page.circuits.length === 0) return;
      untracked(() => {
        if (this.maySave() && this.isPlannable()) void this.store.layOut();
      });
    });
  }

  protected codes(ids: readonly string[]): string {
    return ids.map((id) => this.speech().codeOf(id)).join(', ');
  }

  /** Shows where a breach is: the first defrost that it is about. */
  protected show({ circuitIds, atS }: DefrostBreach): void {
    const [first] = circuitIds;
    const starts = startsOf(this.store.draft()?.plan ?? [], first ?? '');
    const known = starts.find((startS) => startS === atS) ?? starts[0];
    if (first !== undefined) this.store.chosen.set({ circuitId: first as CircuitId, startS: known ?? -1 });
  }

  protected chooseCircuit(circuitId: CircuitId): void {
    this.store.chosen.set({
      circuitId,
      startS: startsOf(this.store.draft()?.plan ?? [], circuitId)[0] ?? -1,
    });
  }

  protected note({ field, isFaulty }: FieldFault): void {
    this.store.noteFault(field, isFaulty);
  }

  protected changeRules(change: Partial<PlanDraft['rules']>): void {
    this.store.change((draft) => ({ ...draft, rules: { ...draft.rules, ...change } }));
  }

  protected shareBox(name: string, circuitIds: readonly string[]): void {
    for (const id of circuitIds) this.store.changeDetails(id as CircuitId, { box: name.slice(0, 60) });
  }
}
