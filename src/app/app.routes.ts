import type { Routes } from '@angular/router';

export const routes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    loadChildren: () => import('./bench/bench.routes').then((m) => m.BENCH_ROUTES),
  },
  {
    path: 'draft',
    title: 'Draft',
    loadChildren: () => import('./editor/editor.routes').then((m) => m.EDITOR_ROUTES),
  },
  {
    path: 'designs/:id',
    title: 'Design',
    loadChildren: () => import('./editor/editor.routes').then((m) => m.EDITOR_ROUTES),
  },
  { path: 'account', loadChildren: () => import('./account/account.routes').then((m) => m.ACCOUNT_ROUTES) },
  {
    path: '**',
    title: 'Not found',
    loadComponent: () => import('./core/shell/not-found-page').then((m) => m.NotFoundPage),
  },
];
