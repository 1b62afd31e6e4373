import type { Routes } from '@angular/router';

/** What coordinators see of a cycle's applicants; children of the cycle's own frame. */
export const applicantsRoutes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    title: 'Applicants',
    loadComponent: () => import('./applicants-page/applicants-page').then((m) => m.ApplicantsPageView),
  },
  {
    path: 'import',
    title: 'Import applicants',
    loadComponent: () => import('./import-page/import-page').then((m) => m.ImportPage),
  },
];
