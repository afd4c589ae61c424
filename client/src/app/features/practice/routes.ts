import type { Routes } from '@angular/router';

export const practiceRoutes: Routes = [
  {
    path: '',
    title: $localize`Practice`,
    loadComponent: () => import('./practice-page').then(({ PracticePage }) => PracticePage),
  },
];
