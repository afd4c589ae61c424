import type { Routes } from '@angular/router';

export const liftRoutes: Routes = [
  {
    path: '',
    title: $localize`Lifts`,
    loadComponent: () => import('./lift-list').then(({ LiftList }) => LiftList),
  },
  {
    path: ':liftId',
    title: $localize`Lift`,
    loadComponent: () => import('./lift-page').then(({ LiftPage }) => LiftPage),
  },
  {
    path: ':liftId/label',
    title: $localize`Label`,
    loadComponent: () => import('./lift-label').then(({ LiftLabel }) => LiftLabel),
  },
];
