import type { Routes } from '@angular/router';

export const reviewRoutes: Routes = [
  {
    path: '',
    title: $localize`To review`,
    loadComponent: () => import('./review-queue').then(({ ReviewQueue }) => ReviewQueue),
  },
  {
    path: ':caseId',
    title: $localize`Review`,
    loadComponent: () => import('./review-page').then(({ ReviewPage }) => ReviewPage),
  },
];
