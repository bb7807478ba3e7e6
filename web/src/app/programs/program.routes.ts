import type { Routes } from '@angular/router';
import { unsavedGuard } from '../ui/unsaved/unsaved-guard';

export const programRoutes: Routes = [
  { path: '', loadComponent: () => import('./program-list-page').then((m) => m.ProgramListPage) },
  {
    path: ':id',
    title: 'Program',
    canDeactivate: [unsavedGuard],
    loadComponent: () => import('./program-page').then((m) => m.ProgramPage),
  },
];
