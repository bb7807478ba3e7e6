import type { Routes } from '@angular/router';
import { openLastMachine } from '../machines/open-last-machine';
import { unsavedGuard } from '../ui/unsaved/unsaved-guard';

export const changeMacroRoutes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    canActivate: [openLastMachine('/change-macro')],
    loadComponent: () => import('../machines/no-machine-page').then((m) => m.NoMachinePage),
  },
  {
    path: ':machineId',
    canDeactivate: [unsavedGuard],
    loadComponent: () => import('./change-macro-page').then((m) => m.ChangeMacroPage),
  },
];
