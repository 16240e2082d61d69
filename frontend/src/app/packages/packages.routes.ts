import type { Routes } from '@angular/router';

/** One handover package, for whoever may read it. */
export const PACKAGES_ROUTES: Routes = [
  // A link cut short leads to where the reader's packages are, not to an empty page.
  { path: '', pathMatch: 'full', redirectTo: '/' },
  { path: ':packageId', loadComponent: async () => (await import('./package-page')).PackagePage },
];

/** The handover packages of one opening. */
export const OPENING_PACKAGES_ROUTES: Routes = [
  { path: '', loadComponent: async () => (await import('./packages-page')).PackagesPage },
];
