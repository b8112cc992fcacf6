import type { Routes } from '@angular/router';

export const ACCOUNT_ROUTES: Routes = [];
