import type { Routes } from '@angular/router';

/** The defrost plan of one opening. */
export const DEFROSTS_ROUTES: Routes = [
  { path: '', loadComponent: async () => (await import('./defrost-page')).DefrostPage },
];
