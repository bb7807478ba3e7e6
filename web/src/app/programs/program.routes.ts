import type { Routes } from '@angular/router';

export const programRoutes: Routes = [
  { path: '', loadComponent: () => import('./program-list-page').then((m) => m.ProgramListPage) },
  { path: ':id', loadComponent: () => import('./program-page').then((m) => m.ProgramPage) },
];
