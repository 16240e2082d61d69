import type { Routes } from '@angular/router';

/** The review queue over all openings, and one sequence under review. */
export const REVIEWS_ROUTES: Routes = [
  { path: '', pathMatch: 'full', loadComponent: async () => (await import('./queue-page')).QueuePage },
  { path: ':sequenceId', loadComponent: async () => (await import('./review-page')).ReviewPage },
];
