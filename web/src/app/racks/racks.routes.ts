import type { Routes } from '@angular/router';
import { openLastMachine } from '../machines/open-last-machine';
import { unsavedGuard } from '../ui/unsaved/unsaved-guard';

export const rackRoutes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    canActivate: [openLastMachine('/racks')],
    loadComponent: () => import('../machines/no-machine-page').then((m) => m.NoMachinePage),
  },
  {
    path: ':machineId',
    canDeactivate: [unsavedGuard],
    loadComponent: () => import('./rack-page').then((m) => m.RackPage),
  },
];
