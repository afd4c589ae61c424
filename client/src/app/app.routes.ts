import { inject } from '@angular/core';
import { Router, type CanActivateFn, type Routes } from '@angular/router';
import { DeviceStore } from './core/device/device-store';
import { hasRole, homeOf, signedIn } from './core/session/guards';
import { SessionStore } from './core/session/session-store';

const toHome: CanActivateFn = () =>
  inject(Router).parseUrl(homeOf(inject(SessionStore).session()?.person.role));

/** A label that this phone does not know is looked up by the lifts page. */
const toLiftOfLabel: CanActivateFn = ({ params }) => {
  const label = String(params['label']).toUpperCase();
  const lift = inject(DeviceStore)
    .lifts()
    .find((held) => held.label === label);
  return lift
    ? inject(Router).createUrlTree(['/lifts', lift.id])
    : inject(Router).createUrlTree(['/lifts'], { queryParams: { label } });
};

/** `bare`: the page has the whole screen, without the navigation. */
export const appRoutes: Routes = [
  { path: '', pathMatch: 'full', canActivate: [signedIn, toHome], children: [] },
  {
    path: 'sign-in',
    title: $localize`Sign in`,
    data: { bare: true },
    loadComponent: () => import('./core/session/sign-in').then(({ SignIn }) => SignIn),
  },
  // The address in a label's QR code.
  { path: 'l/:label', canActivate: [signedIn, toLiftOfLabel], children: [] },
  {
    path: 'lifts',
    canActivate: [signedIn],
    loadChildren: () => import('./features/lifts/routes').then((m) => m.liftRoutes),
  },
  {
    path: 'cases',
    canActivate: [signedIn],
    loadChildren: () => import('./features/cases/routes').then((m) => m.caseRoutes),
  },
  {
    path: 'review',
    canActivate: [signedIn, hasRole('supervisor')],
    loadChildren: () => import('./features/review/routes').then((m) => m.reviewRoutes),
  },
  {
    path: 'people',
    canActivate: [signedIn, hasRole('supervisor', 'administrator')],
    loadChildren: () => import('./features/people/routes').then((m) => m.peopleRoutes),
  },
  {
    path: 'circuits',
    canActivate: [signedIn, hasRole('engineer', 'administrator')],
    loadChildren: () => import('./features/circuits/routes').then((m) => m.circuitRoutes),
  },
  {
    path: 'practice',
    canActivate: [signedIn],
    loadChildren: () => import('./features/practice/routes').then((m) => m.practiceRoutes),
  },
  {
    path: 'phone',
    canActivate: [signedIn],
    loadChildren: () => import('./features/phone/routes').then((m) => m.phoneRoutes),
  },
  {
    path: '**',
    title: $localize`Not found`,
    loadComponent: () => import('./core/shell/not-found').then(({ NotFound }) => NotFound),
  },
];
