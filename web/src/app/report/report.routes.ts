import type { Routes } from '@angular/router';

export const reportRoutes: Routes = [
  { path: ':id', loadComponent: () => import('./report-page').then((m) => m.ReportPage) },
];
