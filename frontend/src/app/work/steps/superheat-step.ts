import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  ElementRef,
  inject,
  signal,
} from '@angular/core';
import { TranslocoPipe } from '@jsverse/transloco';
import { DEFAULT_WAIT_S, type ValveTurn } from '#shared/checklist/kinds/superheat';
import { PhoneDevice } from '../../session/phone-device';
import { TextOf } from '../../ui/text-of';
import { NOW_MS, ticking } from '../coil-walk/phone-clock';
import { valveWait } from '../coil-walk/valve-wait';
import { WaitTimer } from '../coil-walk/wait-timer';
import { GaugeExplained } from './gauge-explained';
import { InstrumentMemory } from './instrument-memory';
import { LiveJudgement } from './live-judgement';
import { ObservationBoxes } from './observation-boxes';
import { StepDraft } from './step-draft';
import { superheatAnswerOf, superheatLacks } from './superheat-answer';
import { conditionsBefore, hadAsFound } from './superheat-before';
import { SuperheatConditions } from './superheat-conditions';
import { hintOf, newestLook, readSuperheatK } from './superheat-hint';
import { SuperheatHintLine } from './superheat-hint-line';
import { SuperheatInstruments } from './superheat-instruments';
import { liveObservation } from './superheat-live';
import { SuperheatMeans } from './superheat-means';
import { SuperheatPlace } from './superheat-place';
import { SuperheatReadBefore } from './superheat-read-before';
import { withoutLastTurn, withTurn } from './superheat-turning';
import { isBlank, pairsOf, startSuperheat, type TypedSuperheat } from './superheat-typed';
import { SuperheatValve } from './superheat-valve';
import { WantedLimits } from './wanted-limits';

const LOOKS = ['asFound', 'turning', 'asLeft'] as const;
type Look = (typeof LOOKS)[number];

/** Superheat of one coil, before and after the valve was touched. Saturation is worked out, never looked up by hand. */
@Component({
  selector: 'app-superheat-step',
  imports: [
    GaugeExplained,
    LiveJudgement,
    ObservationBoxes,
    SuperheatConditions,
    SuperheatHintLine,
    SuperheatInstruments,
    SuperheatMeans,
    SuperheatPlace,
    SuperheatReadBefore,
    SuperheatValve,
    TextOf,
    TranslocoPipe,
    WaitTimer,
    WantedLimits,
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './superheat-step.html',
  styleUrl: './segments.scss',
})
export class SuperheatStep {
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  private readonly memory = inject(InstrumentMemory);
  private readonly nowMs = inject(NOW_MS);
  private readonly now = ticking();
  protected readonly draft = inject(StepDraft);
  protected readonly step = this.draft.stepOf('superheat');
  protected readonly facts = this.draft.current.facts;
  protected readonly typed = this.draft.form(
    startSuperheat(this.draft.previousOf('superheat'), {
      instruments: this.memory.read(this.facts.unitSystem),
      conditions: conditionsBefore(this.draft.current.whole, inject(PhoneDevice).deviceId(), this.nowMs()),
    }),
  );
  protected readonly looks = LOOKS;
  private readonly hadAsFound = hadAsFound(this.draft.current.view);
  /** What was read before a change made it stale. */
  protected readonly stale =
    this.draft.current.view.again === 'stale' ? this.draft.current.view.current : null;
  protected readonly look = signal<Look>(this.firstLook());
  protected readonly side = computed(() => (this.look() === 'asFound' ? 'asFound' : 'asLeft'));
  protected readonly observation = computed(() => this.typed()[this.side()]);
  protected readonly judgement = computed(() => this.judged(this.side()));
  protected readonly lacksAsFound = computed(
    () => this.look() !== 'asFound' && isBlank(this.typed().asFound) && !this.hadAsFound,
  );
  protected readonly wait = computed(() =>
    valveWait(this.typed().turns, this.now(), this.step.waitS ?? DEFAULT_WAIT_S),
  );
  /** Said once, when it happens: the ticking itself is nothing to listen to. */
  protected readonly isWaitOver = computed(() => this.wait()?.isOver ?? false);
  private readonly newest = computed(() => newestLook(this.typed()));
  private readonly newestJudgement = computed(() => {
    const newest = this.newest();
    return newest && this.judged(newest);
  });
  /** On the page of the reading that it is about, and where the valve is turned. */
  protected readonly hint = computed(() =>
    this.look() === 'turning' || this.look() === this.newest()
      ? hintOf(this.newestJudgement(), this.typed(), this.step, this.now())
      : null,
  );
  protected readonly pressure = computed(
    () => pairsOf(this.observation()).findLast((pair) => pair.pressure.trim() !== '')?.pressure ?? '',
  );

  constructor() {
    effect(() => {
      const typed = this.typed();
      this.draft.propose(superheatAnswerOf(typed, this.draft.unitSystem), superheatLacks(typed));
    });
    effect(() => this.draft.tellUnsettled(this.wait()?.isOver === false));
  }

  protected change(change: Partial<TypedSuperheat>): void {
    const read = change.asLeft ? { leftAtMs: this.nowMs() } : {};
    this.typed.set({ ...this.typed(), ...change, ...read });
    if (change.instruments) this.memory.keep(this.facts.unitSystem, change.instruments);
  }

  protected turn(turn: Omit<ValveTurn, 'at'>): void {
    const newestK = readSuperheatK(this.newestJudgement());
    this.typed.set(withTurn(this.typed(), turn, newestK, this.step, this.nowMs()));
    // The wait begins: what counts down comes into sight.
    setTimeout(() => {
      this.host.nativeElement.querySelector('app-wait-timer')?.scrollIntoView({ block: 'center' });
    });
  }

  protected takeBackTurn(): void {
    this.typed.set(withoutLastTurn(this.typed()));
  }

  /** The valve was left alone: what was found is what is left. */
  protected takeOverAsFound(): void {
    this.change({ asLeft: this.typed().asFound });
    this.look.set('asLeft');
  }

  protected isFilled(look: Look): boolean {
    return look === 'turning' ? this.typed().turns.length > 0 : !isBlank(this.typed()[look]);
  }

  private judged(look: 'asFound' | 'asLeft') {
    return liveObservation(this.typed()[look], this.step, this.facts, this.typed());
  }

  // Whoever comes back after the valve settled goes on at the as-left; so does who reads a stale one again.
  private firstLook(): Look {
    const { asFound, asLeft, turns } = this.typed();
    const isBegun = !isBlank(asFound) || !isBlank(asLeft) || turns.length > 0;
    return isBegun || this.stale ? 'asLeft' : 'asFound';
  }
}
