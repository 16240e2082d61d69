import type { Routes } from '@angular/router';

/** The designer's schedule of one opening. */
export const SCHEDULES_ROUTES: Routes = [
  { path: '', loadComponent: async () => (await import('./schedule-page')).SchedulePage },
];
