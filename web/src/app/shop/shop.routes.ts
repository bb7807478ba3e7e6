import type { Routes } from '@angular/router';
import { mayGuard } from '../sign-in/permission-guard';
import { unsavedGuard } from '../ui/unsaved/unsaved-guard';

export const shopRoutes: Routes = [
  {
    path: '',
    loadComponent: () => import('./shop-page').then((m) => m.ShopPage),
    children: [
      {
        path: '',
        pathMatch: 'full',
        loadComponent: () => import('./shop-start').then((m) => m.ShopStart),
      },
      {
        path: 'you',
        title: 'Your settings',
        loadComponent: () => import('./you-page').then((m) => m.YouPage),
      },
      {
        path: 'people',
        title: 'People',
        canActivate: [mayGuard('manage-people')],
        loadComponent: () => import('./people-page').then((m) => m.PeoplePage),
      },
      {
        path: 'audit',
        title: 'Audit trail',
        canActivate: [mayGuard('set-policy', 'manage-people')],
        loadComponent: () => import('./audit-page').then((m) => m.AuditPage),
      },
      {
        path: 'settings',
        title: 'Shop settings',
        canDeactivate: [unsavedGuard],
        loadComponent: () => import('./settings-page').then((m) => m.SettingsPage),
      },
    ],
  },
];
