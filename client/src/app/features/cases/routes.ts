import type { Routes } from '@angular/router';

export const caseRoutes: Routes = [
  {
    path: '',
    title: $localize`Cases · Lampline`,
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
        title: $localize`Arrive · Lampline`,
        data: { bare: true },
        loadComponent: () => import('./arrive/arrive').then(({ Arrive }) => Arrive),
      },
      {
        path: 'find',
        title: $localize`Next reading · Lampline`,
        data: { bare: true },
        loadComponent: () => import('./find/find').then(({ Find }) => Find),
      },
      {
        path: 'finding',
        title: $localize`Finding · Lampline`,
        data: { bare: true },
        loadComponent: () => import('./finding/state-finding').then((m) => m.StateFinding),
      },
      {
        path: 'repair',
        title: $localize`Repair · Lampline`,
        data: { bare: true },
        loadComponent: () => import('./repair/repair').then(({ Repair }) => Repair),
      },
      {
        path: 'prove',
        title: $localize`Prove · Lampline`,
        data: { bare: true },
        loadComponent: () => import('./prove/prove').then(({ Prove }) => Prove),
      },
      {
        path: 'close',
        title: $localize`Close · Lampline`,
        data: { bare: true },
        loadComponent: () => import('./close/close-case').then(({ CloseCase }) => CloseCase),
      },
      {
        path: 'links',
        title: $localize`Links and things disturbed · Lampline`,
        data: { bare: true },
        loadComponent: () => import('./links/links').then(({ Links }) => Links),
      },
      {
        path: 'more',
        title: $localize`The case · Lampline`,
        data: { bare: true },
        loadComponent: () => import('./more/more').then(({ More }) => More),
      },
    ],
  },
];
