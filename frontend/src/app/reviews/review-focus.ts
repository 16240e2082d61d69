import { afterNextRender, DOCUMENT, inject, Injectable, Injector } from '@angular/core';

/** Where the keyboard stands on the review page, after what it stood on went away. Elements are named by their ids. */
@Injectable()
export class ReviewFocus {
  private readonly document = inject(DOCUMENT);
  private readonly injector = inject(Injector);

  /** Goes to the first of these that is there and shows, once the page is rendered. */
  moveTo(...ids: readonly string[]): void {
    this.afterRendering(() => this.take(ids));
  }

  /** The same, but only when the keyboard stands nowhere any more. */
  keep(...ids: readonly string[]): void {
    this.afterRendering(() => {
      const { activeElement, body } = this.document;
      // A list that a phone hides keeps the focus for a moment, and then drops it.
      if (activeElement && activeElement !== body && isShown(activeElement)) return;
      this.take(ids, { preventScroll: true });
    });
  }

  private take(ids: readonly string[], options: FocusOptions = {}): void {
    for (const id of ids) {
      const element = this.document.getElementById(id);
      element?.focus(options);
      if (element && this.document.activeElement === element) return;
    }
  }

  private afterRendering(act: () => void): void {
    afterNextRender({ read: act }, { injector: this.injector });
  }
}

/** Browsers of the last few years tell; where none does, an element counts as shown. */
function isShown(element: Element): boolean {
  return (element as Partial<Pick<Element, 'checkVisibility'>>).checkVisibility?.call(element) !== false;
}
