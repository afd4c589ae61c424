import type { Routes } from '@angular/router';

export const circuitRoutes: Routes = [
  { path: '', pathMatch: 'full', redirectTo: 'check' },
  {
    path: 'check',
    title: $localize`Check a circuit`,
    loadComponent: () => import('./check-circuit').then(({ CheckCircuit }) => CheckCircuit),
  },
];
