import type { Injector } from '@angular/core';
import { MatIconRegistry } from '@angular/material/icon';
import { DomSanitizer } from '@angular/platform-browser';

/** Icons are our own drawings in `public/icons`, one file each, found by name. */
export function registerIcons(injector: Injector): void {
  const sanitizer = injector.get(DomSanitizer);
  injector
    .get(MatIconRegistry)
    .addSvgIconResolver((name) =>
      /^[a-z-]+$/.test(name) ? sanitizer.bypassSecurityTrustResourceUrl(`/icons/${name}.svg`) : null,
    );
}
