import { ChangeDetectionStrategy, Component, input, model, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { TranslocoDirective } from '@jsverse/transloco';
import type { Signature } from '#shared/checklist/signature';
import type { Step } from '#shared/checklist/step';
import type { Remark } from '#shared/sequences/entry';
import { ProblemNote } from '../ui/notes/problem-note';
import { SignatureBox } from '../ui/signature/signature-box';
import { TextOf } from '../ui/text-of';
import { countedKey } from '../ui/words/counted';
import { Unbroken } from '../ui/words/unbroken';
import type { OutsideStep } from './outside-steps';
import type { Lacking } from './refused-approval';

export type VerdictMode = 'closed' | 'approve' | 'sendBack';

/** The two verdicts: send back with remarks, or approve with a signature. Neither happens by a single slip of a key. */
@Component({
  selector: 'app-verdict-panel',
  imports: [MatButton, ProblemNote, SignatureBox, TextOf, TranslocoDirective, Unbroken],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './verdict-panel.html',
  styleUrl: './verdict-panel.scss',
})
export class VerdictPanel {
  readonly mode = model.required<VerdictMode>();
  readonly remarks = input.required<readonly { readonly remark: Remark; readonly step: Step }[]>();
  /** What the approval covers although it lies outside. */
  readonly outside = input.required<readonly OutsideStep[]>();
  /** What the server said is lacking; `null` when it said nothing of the kind. */
  readonly lacking = input.required<Lacking | null>();
  readonly printedName = input.required<string>();
  readonly isSending = input.required<boolean>();
  readonly problem = input.required<unknown>();
  readonly signature = model.required<Signature | null>();
  readonly approve = output<void>();
  readonly sendBack = output<void>();
  readonly openStep = output<string>();

  protected readonly countedKey = countedKey;
}
