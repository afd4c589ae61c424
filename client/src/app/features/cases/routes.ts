import type { Routes } from '@angular/router';

export const caseRoutes: Routes = [
  {
    path: '',
    title: $localize`Cases`,
    loadComponent: () => import('./case-list').then(({ CaseList }) => CaseList),
  },
  {
    path: ':caseId',
    data: { bare: true },
    loadComponent: () => import('./case-page').then(({ CasePage }) => CasePage),
    children: [
      {
        path: '',
        pathMatch: 'full',
        data: { bare: true },
        loadComponent: () => import('./case-start').then(({ CaseStart }) => CaseStart),
      },
      {
        path: 'arrive',
        title: $localize`Arrive`,
        data: { bare: true },
        loadComponent: () => import('./arrive/arrive').then(({ Arrive }) => Arrive),
      },
      {
        path: 'find',
        title: $localize`Next reading`,
        data: { bare: true },
        loadComponent: () => import('./find/find').then(({ Find }) => Find),
      },
      {
        path: 'finding',
        title: $localize`Finding`,
        data: { bare: true },
        loadComponent: () => import('./finding/state-finding').then((m) => m.StateFinding),
      },
      {
        path: 'repair',
        title: $localize`Repair`,
        data: { bare: true },
        loadComponent: () => import('./repair/repair').then(({ Repair }) => Repair),
      },
      {
        path: 'prove',
        title: $localize`Prove`,
        data: { bare: true },
        loadComponent: () => import('./prove/prove').then(({ Prove }) => Prove),
      },
      {
        path: 'close',
        title: $localize`Close`,
        data: { bare: true },
        loadComponent: () => import('./close/close-case').then(({ CloseCase }) => CloseCase),
      },
      {
        path: 'links',
        title: $localize`Links and things disturbed`,
        data: { bare: true },
        loadComponent: () => import('./links/links').then(({ Links }) => Links),
      },
      {
        path: 'isolate',
        title: $localize`Isolate`,
        data: { bare: true },
        loadComponent: () => import('./isolate/isolate').then(({ Isolate }) => Isolate),
      },
      {
        path: 'more',
        title: $localize`The case`,
        data: { bare: true },
        loadComponent: () => import('./more/more').then(({ More }) => More),
      },
    ],
  },
];
