import type { Routes } from '@angular/router';

export const EDITOR_ROUTES: Routes = [];
