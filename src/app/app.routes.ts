import type { Routes } from '@angular/router';
import { signedIn, withRole } from './core/guards';

/** One lazy line per capability; the pages inside a cycle share its frame. */
export const routes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    title: 'Mentoring programme',
    loadComponent: () => import('./home/home-page').then((m) => m.HomePage),
  },
  { path: 'accounts', loadChildren: () => import('./accounts/accounts.routes').then((m) => m.accountsRoutes) },
  {
    path: 'profiles',
    canActivate: [signedIn],
    loadChildren: () => import('./profiles/profiles.routes').then((m) => m.profilesRoutes),
  },
  {
    path: 'applications',
    canActivate: [signedIn],
    loadChildren: () => import('./applications/applications.routes').then((m) => m.applicationsRoutes),
  },
  { path: 'pairings', loadChildren: () => import('./pairings/pairings.routes').then((m) => m.pairingsRoutes) },
  {
    path: 'cycles/:cycleId',
    canMatch: [(_route, segments) => segments[1]?.path !== 'new'],
    canActivate: [withRole('coordinator')],
    loadComponent: () => import('./cycles/cycle-frame/cycle-frame').then((m) => m.CycleFrame),
    children: [
      {
        path: 'applications',
        loadChildren: () => import('./applications/applicants.routes').then((m) => m.applicantsRoutes),
      },
      { path: 'matching', loadChildren: () => import('./matching/matching.routes').then((m) => m.matchingRoutes) },
      { path: 'pairings', loadChildren: () => import('./pairings/responses.routes').then((m) => m.responsesRoutes) },
      { path: '', loadChildren: () => import('./cycles/cycles.routes').then((m) => m.cycleRoutes) },
    ],
  },
  {
    path: 'cycles',
    canActivate: [withRole('coordinator')],
    loadChildren: () => import('./cycles/cycles.routes').then((m) => m.cyclesRoutes),
  },
  {
    path: 'messages',
    canActivate: [withRole('administrator')],
    loadChildren: () => import('./messages/messages.routes').then((m) => m.messagesRoutes),
  },
  {
    path: '**',
    title: 'Page not found',
    loadComponent: () => import('./core/not-found-page/not-found-page').then((m) => m.NotFoundPage),
  },
];
