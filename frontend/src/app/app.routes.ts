import type { Routes } from '@angular/router';
import { roleHome } from './session/role-home';
import { phoneGuard, signedInGuard } from './session/signed-in-guard';
import { wholeGuard } from './shell/whole-application';

/** Every feature, loaded when it is first opened. `phoneGuard` also lets in a phone whose session has run out. */
export const APP_ROUTES: Routes = [
  { path: '', pathMatch: 'full', redirectTo: roleHome },
  {
    path: 'sign-in',
    title: 'shell.pageSignIn',
    loadComponent: async () => (await import('./session/sign-in-page')).SignInPage,
  },
  {
    path: 'work',
    canActivate: [phoneGuard, wholeGuard],
    title: 'shell.pageWork',
    loadChildren: async () => (await import('./work/work.routes')).WORK_ROUTES,
  },
  {
    path: 'openings',
    canActivate: [signedInGuard, wholeGuard],
    title: 'shell.pageOpenings',
    children: [
      {
        path: ':openingId/schedule',
        title: 'shell.pageSchedule',
        loadChildren: async () => (await import('./schedules/schedules.routes')).SCHEDULES_ROUTES,
      },
      {
        path: ':openingId/defrost',
        title: 'shell.pageDefrost',
        loadChildren: async () => (await import('./defrosts/defrosts.routes')).DEFROSTS_ROUTES,
      },
      {
        path: ':openingId/suction-groups/:suctionGroupId',
        title: 'shell.pageFloodHunt',
        loadChildren: async () => (await import('./flood-hunt/flood-hunt.routes')).FLOOD_HUNT_ROUTES,
      },
      {
        path: ':openingId/packages',
        title: 'shell.pagePackages',
        loadChildren: async () => (await import('./packages/packages.routes')).OPENING_PACKAGES_ROUTES,
      },
      { path: '', loadChildren: async () => (await import('./openings/openings.routes')).OPENINGS_ROUTES },
    ],
  },
  {
    path: 'review',
    canActivate: [signedInGuard, wholeGuard],
    title: 'shell.pageReview',
    loadChildren: async () => (await import('./reviews/reviews.routes')).REVIEWS_ROUTES,
  },
  {
    path: 'refrigerants',
    canActivate: [signedInGuard, wholeGuard],
    title: 'shell.pageRefrigerants',
    loadChildren: async () => (await import('./refrigerants/refrigerants.routes')).REFRIGERANTS_ROUTES,
  },
  {
    path: 'packages',
    canActivate: [signedInGuard, wholeGuard],
    title: 'shell.pagePackages',
    loadChildren: async () => (await import('./packages/packages.routes')).PACKAGES_ROUTES,
  },
  {
    path: '**',
    title: 'shell.pageNotFound',
    loadComponent: async () => (await import('./shell/not-found-page')).NotFoundPage,
  },
];
