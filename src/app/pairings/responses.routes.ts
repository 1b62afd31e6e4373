import type { Routes } from '@angular/router';

/** Inside a cycle's frame: how proposals stand. */
export const responsesRoutes: Routes = [
  {
    path: '',
    title: 'Responses',
    loadComponent: () => import('./responses-page/responses-page').then((m) => m.ResponsesPage),
  },
];
