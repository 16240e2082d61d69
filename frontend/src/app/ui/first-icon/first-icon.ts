import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** The drawings that the first screen shows. */
export type FirstIconName = 'hide' | 'person' | 'show' | 'waiting';

/**
 * An icon of the first screen, drawn in the page itself: Material's icons and their file come with the pages behind it.
 * The same drawings as in `icons.svg`.
 */
@Component({
  selector: 'app-first-icon',
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: `
    <svg viewBox="0 0 24 24" aria-hidden="true">
      @switch (name()) {
        @case ('hide') {
          <path [attr.d]="eye" />
          <path d="M5 19.500 19 4.500" />
        }
        @case ('person') {
          <circle cx="12" cy="8" r="3.600" />
          <path d="M4.500 20c1-4.500 4-6.200 7.500-6.200s6.500 1.700 7.500 6.200" />
        }
        @case ('show') {
          <path [attr.d]="eye" />
          <circle cx="12" cy="12" r="2.800" />
        }
        @case ('waiting') {
          <path d="M12 20.500V8.500M7 13l5-5 5 5" />
          <path d="M5 4.500h14" />
        }
      }
    </svg>
  `,
  styles: `
    :host {
      display: inline-block;
      flex: none;
      width: 24px;
      height: 24px;
    }
    svg {
      display: block;
      width: 100%;
      height: 100%;
      fill: none;
      stroke: currentColor;
      stroke-width: 2;
      stroke-linecap: round;
      stroke-linejoin: round;
    }
  `,
})
export class FirstIcon {
  readonly name = input.required<FirstIconName>();

  protected readonly eye =
    'M2.500 12C5 7.700 8.300 5.800 12 5.800s7 1.900 9.500 6.200c-2.500 4.300-5.800 6.200-9.500 6.200S5 16.300 2.500 12z';
}
