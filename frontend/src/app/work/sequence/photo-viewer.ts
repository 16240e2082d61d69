import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  input,
  output,
  viewChild,
  type ElementRef,
} from '@angular/core';
import { MatIconModule } from '@angular/material/icon';
import { TranslocoPipe } from '@jsverse/transloco';

/** One photo over the whole screen. The browser's own dialog: Escape and the phone's back gesture close it. */
@Component({
  selector: 'app-photo-viewer',
  imports: [MatIconModule, TranslocoPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <dialog #dialog [attr.aria-label]="label()" (close)="closed.emit()">
      <img [src]="url()" [alt]="label()" />
      <button type="button" [attr.aria-label]="'work.closePhoto' | transloco" (click)="dialog.close()">
        <mat-icon svgIcon="close" />
      </button>
    </dialog>
  `,
  styles: `
    dialog {
      width: 100vw;
      height: 100dvh;
      max-width: none;
      max-height: none;
      padding: 0;
      border: 0;
      background: var(--app-paper);
    }
    img {
      width: 100%;
      height: 100%;
      object-fit: contain;
    }
    button {
      position: absolute;
      top: var(--app-space-2);
      right: var(--app-space-2);
      display: grid;
      place-items: center;
      width: var(--app-target);
      height: var(--app-target);
      background: var(--app-sheet);
      border: 1px solid var(--app-rule);
      border-radius: var(--app-corner);
      color: var(--app-ink);
      cursor: pointer;
    }
  `,
})
export class PhotoViewer {
  readonly url = input.required<string>();
  readonly label = input.required<string>();
  readonly closed = output<void>();

  private readonly dialog = viewChild.required<ElementRef<HTMLDialogElement>>('dialog');

  constructor() {
    afterNextRender(() => this.dialog().nativeElement.showModal());
  }
}
