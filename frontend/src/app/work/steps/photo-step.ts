import { ChangeDetectionStrategy, Component, effect, inject, signal } from '@angular/core';
import { MatIconModule } from '@angular/material/icon';
import { TranslocoPipe } from '@jsverse/transloco';
import type { PhotoRef } from '#shared/checklist/kinds/photo';
import type { Text } from '#shared/checklist/text';
import type { LocalPhoto } from '../../offline/local-database';
import { PhotoShrinker, type ShrunkPhoto } from '../../offline/photo-shrinker';
import type { PhotoRefusal } from '../../offline/photo-size';
import { Session } from '../../session/session';
import { TextOf } from '../../ui/text-of';
import { PhotoTray } from './photo-tray';
import { StepDraft } from './step-draft';

/** Photos as evidence: by the camera or out of the roll, shrunk on the phone, looked at before they are recorded. */
@Component({
  selector: 'app-photo-step',
  imports: [MatIconModule, TextOf, TranslocoPipe],
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
    const { sequenceId, step, arrivedPhotos } = this.draft.current;
    const recorded = this.draft.previousOf('photo')?.photos ?? [];
    if (me) void this.tray.open(me.id, sequenceId, step.key, recorded, arrivedPhotos);
    effect(() => {
      const photos = this.tray.photos().map((photo) => photo.ref);
      this.draft.propose(photos.length === 0 ? null : { kind: 'photo', photos }, 'photo');
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

  /** The title of another step of this circuit that the picture stands on already. */
  protected elsewhere({ sha256, originalSha256 }: PhotoRef): Text | null {
    const known = this.draft.current.photosElsewhere;
    return known.get(sha256) ?? known.get(originalSha256 ?? '') ?? null;
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
