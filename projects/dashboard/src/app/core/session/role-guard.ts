import { inject } from '@angular/core';
import { type CanActivateFn, Router } from '@angular/router';
import type { Role } from '#shared/domain/vocabulary';
import { homeOf } from './home';
import { Session } from './session';

/** Lets signed-in people through; others sign in first and come back. */
export const signedIn: CanActivateFn = (_route, state) => {
  if (inject(Session).person()) return true;
  return inject(Router).createUrlTree(['/sign-in'], { queryParams: { next: state.url } });
};

/** Lets people of some roles through; others are shown their own first page. */
export function forRoles(...roles: readonly Role[]): CanActivateFn {
  return () => {
    const role = inject(Session).role();
    return role && roles.includes(role) ? true : inject(Router).createUrlTree([homeOf(role)]);
  };
}
