import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { TranslocoDirective } from '@jsverse/transloco';
import type { SequenceDetail } from '#shared/contracts/sequences';
import type { FoldEntry } from '#shared/sequences/fold';
import type { SequenceView } from '#shared/sequences/sequence-view';
import { DateTimeOf } from '../ui/date-time-of';
import { ClosedJoint } from '../ui/joint/closed-joint';
import { OutcomeMark } from '../ui/outcome-mark/outcome-mark';
import { SignatureView } from '../ui/signature/signature-view';
import { TextOf } from '../ui/text-of';
import { countedKey } from '../ui/words/counted';
import { EntryLine } from './entry-line';

/** What stands beside the steps: reviews given, entries that came late or are held, and those no longer asked for. */
@Component({
  selector: 'app-other-entries',
  imports: [ClosedJoint, DateTimeOf, EntryLine, OutcomeMark, SignatureView, TextOf, TranslocoDirective],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './other-entries.html',
  styleUrl: './other-entries.scss',
})
export class OtherEntries {
  readonly sequence = input.required<SequenceDetail>();
  readonly view = input.required<SequenceView>();

  protected readonly countedKey = countedKey;
  protected readonly groups = computed(() =>
    [
      { name: 'late', entries: this.view().late },
      { name: 'held', entries: this.sequence().entries.filter(({ server }) => server.standing === 'held') },
      { name: 'noLongerAsked', entries: this.view().noLongerAsked },
    ]
      .filter(({ entries }) => entries.length > 0)
      .map(({ name, entries }) => ({ name, rows: entries.map((entry) => this.rowOf(entry)) })),
  );
  protected readonly reviews = computed(() =>
    this.sequence().entries.flatMap(({ body, server }) =>
      body.content.kind === 'review'
        ? [{ review: body.content, by: this.nameOf(body.authorId), at: server.receivedAt }]
        : [],
    ),
  );

  private rowOf(entry: FoldEntry) {
    const { content } = entry.body;
    const key = content.kind === 'answer' || content.kind === 'notApplicable' ? content.stepKey : null;
    const step = this.sequence().stepList.steps.find((candidate) => candidate.key === key);
    const judged =
      entry.server.judgement?.outcome ?? (content.kind === 'answer' ? content.workedOut.outcome : null);
    return {
      entry,
      title: step?.title ?? null,
      key,
      outcome: content.kind === 'notApplicable' ? 'notApplicable' : judged,
    } as const;
  }

  private nameOf(id: string): string {
    return this.sequence().people.find((person) => person.id === id)?.name ?? '–';
  }
}
