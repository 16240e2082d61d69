import type { Routes } from '@angular/router';

/** Refrigerants by their makers' own tables: those of the company, and a new one. */
export const REFRIGERANTS_ROUTES: Routes = [
  {
    path: '',
    pathMatch: 'full',
    loadComponent: async () => (await import('./refrigerants-page')).RefrigerantsPage,
  },
  {
    path: 'new',
    title: 'refrigerants.newTitle',
    loadComponent: async () => (await import('./new-table-page')).NewTablePage,
  },
];
