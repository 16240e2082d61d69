import {
  afterNextRender,
  afterRenderEffect,
  ChangeDetectionStrategy,
  Component,
  computed,
  DestroyRef,
  ElementRef,
  inject,
  Injector,
  input,
  model,
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { TranslocoDirective } from '@jsverse/transloco';
import SignaturePad from 'signature_pad';
import type { Signature } from '#shared/checklist/signature';
import { isSameName, toPoints, toStrokes } from './strokes';

let boxes = 0;

/**
 * Takes a signature: drawn in the box, or the name typed for hands that can't draw (WCAG 2.2, 2.5.7). What signing means
 * and the printed name stand with it. `signature` is `null` until something counts as signed.
 */
@Component({
  selector: 'app-signature-box',
  imports: [MatButton, TranslocoDirective],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './signature-box.html',
  styleUrl: './signature-box.scss',
})
export class SignatureBox {
  readonly meaning = input.required<string>();
  readonly printedName = input.required<string>();
  readonly signature = model<Signature | null>(null);

  private readonly canvas = viewChild<ElementRef<HTMLCanvasElement>>('canvas');
  private readonly nameBox = viewChild<ElementRef<HTMLInputElement>>('typed');
  private readonly typeButton = viewChild('typeButton', { read: ElementRef<HTMLElement> });
  private readonly destroyed = inject(DestroyRef);
  private readonly injector = inject(Injector);
  private pad: SignaturePad | null = null;
  private watcher: ResizeObserver | null = null;

  protected readonly isTyping = signal(false);
  protected readonly typedName = signal('');
  /** Whether the name is said to be finished: the box was left, or Enter pressed. */
  protected readonly isFinished = signal(false);
  protected readonly isWrongName = computed(
    () => this.isFinished() && this.typedName().trim() !== '' && this.signature() === null,
  );
  protected readonly wrongId = `signature-wrong-${(boxes += 1)}`;

  constructor() {
    afterRenderEffect(() => {
      const canvas = this.canvas()?.nativeElement;
      // Only another canvas begins anew; a stroke that changes the signature must not.
      untracked(() => {
        this.release();
        if (canvas) this.attach(canvas);
      });
    });
    this.destroyed.onDestroy(() => this.release());
  }

  protected setTyping(isTyping: boolean): void {
    this.signature.set(null);
    this.typedName.set('');
    this.isFinished.set(false);
    this.isTyping.set(isTyping);
    // The button that was pressed is gone: the cursor goes on to what took its place.
    afterNextRender(() => (isTyping ? this.nameBox() : this.typeButton())?.nativeElement.focus(), {
      injector: this.injector,
    });
  }

  protected typeName(name: string): void {
    this.typedName.set(name);
    const signed = isSameName(name, this.printedName());
    this.signature.set(
      signed ? { printedName: this.printedName(), width: 300, height: 120, strokes: [], typed: true } : null,
    );
  }

  protected clear(): void {
    this.pad?.clear();
    this.signature.set(null);
  }

  protected undo(): void {
    if (!this.pad) return;
    this.pad.fromData(this.pad.toData().slice(0, -1));
    this.takeStrokes();
  }

  private attach(canvas: HTMLCanvasElement): void {
    // Without a drawing surface (very old or locked-down browsers) typing is the way that is left.
    if (!canvas.getContext('2d')) {
      this.isTyping.set(true);
      return;
    }
    this.pad = new SignaturePad(canvas, {
      penColor: getComputedStyle(canvas).color,
      minWidth: 0.8,
      maxWidth: 2.4,
    });
    this.pad.addEventListener('endStroke', () => this.takeStrokes());
    this.fit(canvas);
    if (typeof ResizeObserver === 'undefined') return;
    this.watcher = new ResizeObserver(() => this.fit(canvas));
    this.watcher.observe(canvas);
  }

  /** Gives the canvas the sharpness of the screen; setting its size empties it, so the strokes are drawn again. */
  private fit(canvas: HTMLCanvasElement): void {
    const ratio = Math.max(1, window.devicePixelRatio);
    const width = Math.round(canvas.clientWidth * ratio);
    const height = Math.round(canvas.clientHeight * ratio);
    if (!this.pad || width === 0 || (canvas.width === width && canvas.height === height)) return;
    canvas.width = width;
    canvas.height = height;
    canvas.getContext('2d')?.scale(ratio, ratio);
    const kept = this.signature();
    this.pad.clear();
    if (kept) this.redraw(kept);
  }

  private redraw(kept: Signature): void {
    const look = {
      penColor: this.pad?.penColor ?? '',
      dotSize: 0,
      minWidth: 0.8,
      maxWidth: 2.4,
      velocityFilterWeight: 0.7,
      compositeOperation: 'source-over' as const,
    };
    const groups = toPoints(kept).map((points) => ({
      ...look,
      points: points.map((point, index) => ({ ...point, pressure: 0.5, time: index * 16 })),
    }));
    this.pad?.fromData(groups);
  }

  private takeStrokes(): void {
    const canvas = this.canvas()?.nativeElement;
    if (!this.pad || !canvas) return;
    const strokes = toStrokes(this.pad.toData()).filter((stroke) => stroke.length > 0);
    const isSigned = strokes.some((stroke) => stroke.length >= 4);
    this.signature.set(
      isSigned
        ? {
            printedName: this.printedName(),
            width: Math.max(1, canvas.clientWidth),
            height: Math.max(1, canvas.clientHeight),
            strokes,
            typed: false,
          }
        : null,
    );
  }

  private release(): void {
    this.watcher?.disconnect();
    this.watcher = null;
    this.pad?.off();
    this.pad = null;
  }
}
