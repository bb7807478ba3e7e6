import type { Routes } from '@angular/router';

export const changeMacroRoutes: Routes = [
  { path: '', loadComponent: () => import('./change-macro-page').then((m) => m.ChangeMacroPage) },
  {
    path: ':machineId',
    loadComponent: () => import('./change-macro-page').then((m) => m.ChangeMacroPage),
  },
];
