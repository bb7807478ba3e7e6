import type { Routes } from '@angular/router';

export const shopRoutes: Routes = [
  { path: '', pathMatch: 'full', redirectTo: 'people' },
  { path: 'people', loadComponent: () => import('./people-page').then((m) => m.PeoplePage) },
];
