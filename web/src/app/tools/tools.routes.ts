import type { Routes } from '@angular/router';
import { mayGuard } from '../sign-in/permission-guard';
import { unsavedGuard } from '../ui/unsaved/unsaved-guard';

const toolPage = () => import('./tool-page').then((m) => m.ToolPage);

export const toolRoutes: Routes = [
  { path: '', loadComponent: () => import('./tools-page').then((m) => m.ToolsPage) },
  {
    path: 'new',
    title: 'New tool',
    canActivate: [mayGuard('change-tools')],
    canDeactivate: [unsavedGuard],
    loadComponent: toolPage,
  },
  { path: ':toolId', title: 'Tool', canDeactivate: [unsavedGuard], loadComponent: toolPage },
];
