import type { Routes } from '@angular/router';

/** Openings: the ledger, a new one, one of them, its circuits. */
export const OPENINGS_ROUTES: Routes = [
  { path: '', pathMatch: 'full', loadComponent: async () => (await import('./openings-page')).OpeningsPage },
  {
    path: 'new',
    title: 'openings.new',
    loadComponent: async () => (await import('./new-opening-page')).NewOpeningPage,
  },
  { path: ':openingId', loadComponent: async () => (await import('./opening-page')).OpeningPage },
  {
    path: ':openingId/circuits',
    title: 'openings.circuitsTitle',
    loadComponent: async () => (await import('./circuits-page')).CircuitsPage,
  },
];
