import type { Routes } from '@angular/router';

/** An installer's day: the circuits assigned to them, and the steps of one circuit. */
export const WORK_ROUTES: Routes = [
  { path: '', loadComponent: async () => (await import('./circuits/circuits-page')).CircuitsPage },
  {
    path: ':sequenceId/coils',
    loadComponent: async () => (await import('./coil-walk/coil-walk-page')).CoilWalkPage,
  },
  { path: ':sequenceId', loadComponent: async () => (await import('./sequence/sequence-page')).SequencePage },
];
