import type { Routes } from '@angular/router';

export const profilesRoutes: Routes = [
  { path: '', pathMatch: 'full', redirectTo: 'mine' },
  {
    path: 'mine',
    title: 'Mentoring profile',
    loadComponent: () => import('./profile-editor/profile-editor').then((m) => m.ProfileEditor),
  },
  {
    path: ':personId',
    title: 'Profile',
    loadComponent: () => import('./profile-page/profile-page').then((m) => m.ProfilePage),
  },
];
