import type { Injector } from '@angular/core';
import { MatIconRegistry } from '@angular/material/icon';
import { DomSanitizer } from '@angular/platform-browser';
import { firstValueFrom } from 'rxjs';

/**
 * Icons are our own drawings, all in one file. It is fetched at once, so that a phone which loses its network has them
 * all, also the one that says so.
 */
export function registerIcons(injector: Injector): void {
  const sanitizer = injector.get(DomSanitizer);
  const registry = injector.get(MatIconRegistry);
  registry.addSvgIconSet(sanitizer.bypassSecurityTrustResourceUrl('/icons.svg'));
  // Without a network the first icon that is shown asks again, and says so.
  firstValueFrom(registry.getNamedSvgIcon('waiting')).catch(ignore);
}

function ignore(): void {
  // Nothing shows an icon yet.
}
