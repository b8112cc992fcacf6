import type { Routes } from '@angular/router';
import { provideIcons } from '../core/icons/provide-icons';
import { memberGuard, visitorGuard } from '../core/session/guards';
import { ACCOUNT_ICONS } from './account-icons';

export const ACCOUNT_ROUTES: Routes = [
  {
    path: '',
    providers: [provideIcons(ACCOUNT_ICONS)],
    children: [
      {
        path: '',
        pathMatch: 'full',
        title: 'Account',
        canActivate: [memberGuard],
        loadComponent: () => import('./account-page').then((m) => m.AccountPage),
      },
      {
        path: 'sign-in',
        title: 'Sign in',
        canActivate: [visitorGuard],
        loadComponent: () => import('./sign-in-page').then((m) => m.SignInPage),
      },
      {
        path: 'sign-up',
        title: 'Make an account',
        canActivate: [visitorGuard],
        loadComponent: () => import('./sign-up-page').then((m) => m.SignUpPage),
      },
    ],
  },
];
