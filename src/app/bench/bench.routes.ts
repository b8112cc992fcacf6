import type { Routes } from '@angular/router';
import { provideIcons } from '../core/icons/provide-icons';
import { BENCH_ICONS } from './bench-icons';
import { BenchPage } from './bench-page';

export const BENCH_ROUTES: Routes = [
  { path: '', title: 'Bench', component: BenchPage, providers: [provideIcons(BENCH_ICONS)] },
];
