import type { Routes } from '@angular/router';
import { mayGuard } from '../sign-in/permission-guard';
import { unsavedGuard } from '../ui/unsaved/unsaved-guard';
import { PART_NAMES } from './machine-parts';

export const machineRoutes: Routes = [
  { path: '', loadComponent: () => import('./machines-page').then((m) => m.MachinesPage) },
  {
    path: 'new',
    title: 'New machine',
    canActivate: [mayGuard('change-machine')],
    canDeactivate: [unsavedGuard],
    loadComponent: () => import('./new-machine-page').then((m) => m.NewMachinePage),
  },
  {
    path: ':machineId',
    loadComponent: () => import('./machine-page').then((m) => m.MachinePage),
    children: [
      { path: '', pathMatch: 'full', redirectTo: 'overview' },
      {
        path: 'overview',
        loadComponent: () => import('./machine-overview').then((m) => m.MachineOverview),
      },
      ...PART_NAMES.map((part) => ({
        path: part,
        data: { part },
        canDeactivate: [unsavedGuard],
        loadComponent: () => import('./machine-part-page').then((m) => m.MachinePartPage),
      })),
      { path: 'setup', loadComponent: () => import('./setup-page').then((m) => m.SetupPage) },
    ],
  },
];
