import type { Routes } from '@angular/router';
import { signedIn } from '../core/guards';

/** One's own proposals and pairs; the page behind a proposal's link needs no sign-in. */
export const pairingsRoutes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    title: 'Proposals and pairs',
    canActivate: [signedIn],
    loadComponent: () => import('./pairings-page/pairings-page').then((m) => m.PairingsPage),
  },
  {
    path: 'proposal/:token',
    title: 'Proposal',
    loadComponent: () => import('./proposal-page/proposal-page').then((m) => m.ProposalPage),
  },
];
