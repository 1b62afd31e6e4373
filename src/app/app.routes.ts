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
