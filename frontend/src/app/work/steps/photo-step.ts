import { ChangeDetectionStrategy, Component, effect, inject, signal } from '@angular/core';
import { MatIconModule } from '@angular/material/icon';
import { TranslocoPipe } from '@jsverse/transloco';
import type { LocalPhoto } from '../../offline/local-database';
import { PhotoShrinker, type ShrunkPhoto } from '../../offline/photo-shrinker';
import type { PhotoRefusal } from '../../offline/photo-size';
import { Session } from '../../session/session';
import { PhotoTray } from './photo-tray';
import { StepDraft } from './step-draft';

/** Photos as evidence: by the camera or out of the roll, shrunk on the phone, looked at before they are recorded. */
@Component({
  selector: 'app-photo-step',
  imports: [MatIconModule, TranslocoPipe],
  providers: [PhotoTray],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './photo-step.html',
  styleUrl: './photo-step.scss',
})
export class PhotoStep {
  private readonly draft = inject(StepDraft);
  private readonly shrinker = inject(PhotoShrinker);
  private readonly me = inject(Session).me;
  protected readonly tray = inject(PhotoTray);
  protected readonly step = this.draft.stepOf('photo');
  protected readonly working = signal(0);
  protected readonly problem = signal<PhotoRefusal | 'phoneFull' | null>(null);

  constructor() {
    const me = this.me();
    const { sequenceId, step } = this.draft.current;
    if (me) void this.tray.open(me.id, sequenceId, step.key, this.draft.previousOf('photo')?.photos ?? []);
    effect(() => {
      const photos = this.tray.photos().map((photo) => photo.ref);
      this.draft.propose(photos.length === 0 ? null : { kind: 'photo', photos });
    });
  }

  protected async take(event: Event): Promise<void> {
    const box = event.target as HTMLInputElement;
    const files = [...(box.files ?? [])];
    // Empty again, so that the same file can be chosen twice.
    box.value = '';
    this.problem.set(null);
    for (const file of files) await this.takeOne(file);
  }

  protected remove(sha256: string): Promise<void> {
    return this.tray.remove(this.draft.current.sequenceId, sha256);
  }

  private async takeOne(file: File): Promise<void> {
    this.working.update((count) => count + 1);
    try {
      const result = await this.shrinker.shrink(file);
      if (result.ok) await this.keep(result.photo);
      else this.problem.set(result.reason);
    } catch (error) {
      if (!(error instanceof DOMException) || error.name !== 'QuotaExceededError') throw error;
      this.problem.set('phoneFull');
    } finally {
      this.working.update((count) => count - 1);
    }
  }

  private async keep(photo: ShrunkPhoto): Promise<void> {
    const me = this.me();
    if (!me) return;
    const { sequenceId, step } = this.draft.current;
    const local: LocalPhoto = {
      ...photo,
      sequenceId,
      personId: me.id,
      stepKey: step.key,
      state: 'draft',
      reason: null,
      changedAt: new Date().toISOString(),
    };
    await this.tray.add(local);
  }
}
