import type { Routes } from '@angular/router';

export const machineRoutes: Routes = [
  { path: '', loadComponent: () => import('./machines-page').then((m) => m.MachinesPage) },
  { path: ':id', loadComponent: () => import('./machines-page').then((m) => m.MachinesPage) },
];
