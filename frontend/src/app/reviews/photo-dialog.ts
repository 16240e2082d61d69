import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogClose } from '@angular/material/dialog';
import { TranslocoDirective } from '@jsverse/transloco';

/** Photos to look through, and the one to begin with. */
export interface PhotoSet {
  readonly urls: readonly string[];
  readonly start: number;
  readonly title: string;
}

const ZOOMS = [1, 2, 4] as const;

/** Photos at full size: arrows go through them, plus and minus zoom, the picture scrolls when it is larger than the room. */
@Component({
  selector: 'app-photo-dialog',
  imports: [MatButton, MatDialogClose, TranslocoDirective],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <ng-container *transloco="let t; prefix: 'reviews'">
      <header>
        <h2>{{ photos.title }}</h2>
        <span aria-live="polite">{{ t('photoOf', { number: index() + 1, count: photos.urls.length }) }}</span>
        <span class="tools">
          @if (photos.urls.length > 1) {
            <button matButton type="button" [disabled]="index() === 0" (click)="go(-1)">
              {{ t('photoPrevious') }}
            </button>
            <button matButton type="button" [disabled]="index() === photos.urls.length - 1" (click)="go(1)">
              {{ t('photoNext') }}
            </button>
          }
          <button matButton type="button" [disabled]="zoom() === 0" (click)="zoomBy(-1)">
            {{ t('zoomOut') }}
          </button>
          <button matButton type="button" [disabled]="zoom() === most" (click)="zoomBy(1)">
            {{ t('zoomIn') }}
          </button>
          <button matButton="outlined" type="button" matDialogClose>{{ t('close') }}</button>
        </span>
      </header>
      <div class="room" tabindex="0" [attr.aria-label]="photos.title">
        @if (isBroken()) {
          <p>{{ t('photoUnreadable') }}</p>
        } @else {
          <img
            [src]="url()"
            [alt]="photos.title"
            [class.whole]="zoom() === 0"
            [style.width.%]="zoom() === 0 ? null : scale() * 100"
            (error)="isBroken.set(true)"
            (dblclick)="zoom.set(zoom() === 0 ? 1 : 0)"
          />
        }
      </div>
    </ng-container>
  `,
  styleUrl: './photo-dialog.scss',
  host: { '(keydown)': 'press($event)' },
})
export class PhotoDialog {
  protected readonly photos = inject<PhotoSet>(MAT_DIALOG_DATA);
  protected readonly index = signal(this.photos.start);
  protected readonly zoom = signal(0);
  protected readonly isBroken = signal(false);
  protected readonly most = ZOOMS.length - 1;
  protected readonly scale = computed(() => ZOOMS[this.zoom()] ?? 1);
  protected readonly url = computed(() => this.photos.urls[this.index()] ?? '');

  protected go(by: number): void {
    this.index.set(Math.min(Math.max(this.index() + by, 0), this.photos.urls.length - 1));
    this.isBroken.set(false);
  }

  protected zoomBy(by: number): void {
    this.zoom.set(Math.min(Math.max(this.zoom() + by, 0), this.most));
  }

  protected press(event: KeyboardEvent): void {
    if (event.key === '+' || event.key === '=') this.zoomBy(1);
    else if (event.key === '-') this.zoomBy(-1);
    // Zoomed in, the arrows scroll the picture.
    else if (this.zoom() === 0 && event.key === 'ArrowRight') this.go(1);
    else if (this.zoom() === 0 && event.key === 'ArrowLeft') this.go(-1);
  }
}
