import type { Routes } from '@angular/router';

export const peopleRoutes: Routes = [
  {
    path: '',
    title: $localize`People`,
    loadComponent: () => import('./people-page').then(({ PeoplePage }) => PeoplePage),
  },
];
