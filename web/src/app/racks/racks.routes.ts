import type { Routes } from '@angular/router';

export const rackRoutes: Routes = [
  { path: '', loadComponent: () => import('./rack-page').then((m) => m.RackPage) },
  { path: ':machineId', loadComponent: () => import('./rack-page').then((m) => m.RackPage) },
];
