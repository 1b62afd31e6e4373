import type { Routes } from '@angular/router';
import { withRole } from '../core/guards';

export const accountsRoutes: Routes = [
  {
    path: 'sign-in',
    title: 'Sign in',
    loadComponent: () => import('./sign-in-page/sign-in-page').then((m) => m.SignInPage),
  },
  {
    path: 'register',
    title: 'Register',
    loadComponent: () => import('./register-page/register-page').then((m) => m.RegisterPage),
  },
  {
    path: 'confirm/:token',
    title: 'Confirm your address',
    loadComponent: () => import('./confirm-page/confirm-page').then((m) => m.ConfirmPage),
  },
  {
    path: 'forgotten',
    title: 'Forgotten password',
    loadComponent: () => import('./forgotten-page/forgotten-page').then((m) => m.ForgottenPage),
  },
  {
    path: 'reset/:token',
    title: 'New password',
    loadComponent: () => import('./reset-page/reset-page').then((m) => m.ResetPage),
  },
  {
    path: 'invitation/:token',
    title: 'Invitation',
    loadComponent: () => import('./invitation-page/invitation-page').then((m) => m.InvitationPage),
  },
  {
    path: 'no-right',
    title: 'Not for your role',
    loadComponent: () => import('./no-right-page/no-right-page').then((m) => m.NoRightPage),
  },
  {
    path: 'people',
    title: 'People',
    canActivate: [withRole('administrator')],
    loadComponent: () => import('./people-page/people-page').then((m) => m.PeoplePage),
  },
];
