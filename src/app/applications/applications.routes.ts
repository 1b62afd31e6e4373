import type { Routes } from '@angular/router';

/** What applicants see of their own. */
export const applicationsRoutes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    title: 'Your applications',
    loadComponent: () => import('./own-applications-page/own-applications-page').then((m) => m.OwnApplicationsPage),
  },
  {
    path: ':cycleId',
    title: 'Apply',
    loadComponent: () => import('./application-form-page/application-form-page').then((m) => m.ApplicationFormPage),
  },
];
