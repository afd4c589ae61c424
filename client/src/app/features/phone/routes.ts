import type { Routes } from '@angular/router';

export const phoneRoutes: Routes = [
  {
    path: '',
    title: $localize`This phone`,
    loadComponent: () => import('./phone-page').then(({ PhonePage }) => PhonePage),
  },
];
