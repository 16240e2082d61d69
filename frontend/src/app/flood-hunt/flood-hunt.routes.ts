import type { Routes } from '@angular/router';

/** Which fixture of a suction group to feel first. */
export const FLOOD_HUNT_ROUTES: Routes = [
  { path: '', loadComponent: async () => (await import('./flood-hunt-page')).FloodHuntPage },
];
