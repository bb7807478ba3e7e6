import type { Routes } from '@angular/router';

export const toolRoutes: Routes = [
  { path: '', loadComponent: () => import('./tools-page').then((m) => m.ToolsPage) },
];
