import { inject } from '@angular/core';
import { type CanActivateFn, RedirectCommand, Router } from '@angular/router';
import type { Role } from '../../../shared/accounts/accounts-contract';
import { SessionStore } from './session-store';

// Guards spare people a page they cannot use; the server decides on its own whatever they let through.

/** Visitors sign in first and come back to where they wanted to go. */
export const signedIn: CanActivateFn = (_route, state) => {
  if (inject(SessionStore).person()) return true;
  return new RedirectCommand(inject(Router).createUrlTree(['/accounts/sign-in'], { queryParams: { next: state.url } }));
};

/** People without the role get a page that says so. */
export const withRole =
  (role: Role): CanActivateFn =>
  (route, state) => {
    const session = inject(SessionStore);
    if (!session.person()) return signedIn(route, state);
    if (session.hasRole(role)) return true;
    return new RedirectCommand(inject(Router).createUrlTree(['/accounts/no-right']), { skipLocationChange: true });
  };

/** A path of this site to go to after signing in; anything else leads home. */
export function safePath(next: string | undefined): string {
  if (!next || !/^\/(?![/\\])/.test(next)) return '/';
  // Neither control characters nor backslashes, which some browsers read as slashes.
  if ([...decodeURIComponentOr(next)].some((sign) => sign < ' ' || sign === '\\')) return '/';
  return next;
}

function decodeURIComponentOr(text: string): string {
  try {
    return decodeURIComponent(text);
  } catch {
    return '\\';
  }
}
