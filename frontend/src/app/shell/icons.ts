import type { Injector } from '@angular/core';
import { MatIconRegistry } from '@angular/material/icon';
import { DomSanitizer } from '@angular/platform-browser';

/**
 * Icons are our own drawings, all in one file: whatever was shown first has brought them all, also the one that says
 * that the network is gone.
 */
export function registerIcons(injector: Injector): void {
  const sanitizer = injector.get(DomSanitizer);
  injector.get(MatIconRegistry).addSvgIconSet(sanitizer.bypassSecurityTrustResourceUrl('/icons.svg'));
}
