import { inject } from '@angular/core';
import { Router, type CanActivateFn } from '@angular/router';
import type { Role } from '@shared/contract';
import { SessionStore } from './session-store';

/** Lets in who is signed in; others go to the sign-in page and come back afterwards. */
export const signedIn: CanActivateFn = (_, { url }) =>
  inject(SessionStore).session() !== undefined ||
  inject(Router).createUrlTree(['/sign-in'], { queryParams: url === '/' ? {} : { back: url } });

/** Lets in some roles; the API checks again. */
export const hasRole =
  (...allowed: readonly Role[]): CanActivateFn =>
  () => {
    const role = inject(SessionStore).role();
    return (role !== undefined && allowed.includes(role)) || inject(Router).createUrlTree(['/']);
  };

/** Where a role starts its day. */
export const homeOf = (role: Role | undefined): string =>
  role === 'supervisor' ? '/review' : role === 'administrator' ? '/people' : '/lifts';
