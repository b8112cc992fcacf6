import type { Routes } from '@angular/router';
import { provideIcons } from '../core/icons/provide-icons';
import { EDITOR_ICONS } from './editor-icons';
import { EditorPage } from './editor-page';

export const EDITOR_ROUTES: Routes = [
  { path: '', component: EditorPage, providers: [provideIcons(EDITOR_ICONS)] },
];
