import type { Routes } from '@angular/router';
import { signedInGuard } from './sign-in/signed-in-guard';

/** Every place of the product, each loaded when it is first opened. Places not built are absent. */
export const routes: Routes = [
  {
    path: 'sign-in',
    title: 'Sign in',
    loadComponent: () => import('./sign-in/sign-in-page').then((m) => m.SignInPage),
  },
  {
    path: 'first-run',
    title: 'First set-up',
    loadComponent: () => import('./sign-in/first-run-page').then((m) => m.FirstRunPage),
  },
  {
    path: '',
    canActivate: [signedInGuard],
    loadComponent: () => import('./shell/shell').then((m) => m.Shell),
    children: [
      { path: '', pathMatch: 'full', redirectTo: 'bench' },
      {
        path: 'bench',
        title: 'Bench',
        loadComponent: () => import('./bench/bench-page').then((m) => m.BenchPage),
      },
      {
        path: 'programs',
        title: 'Programs',
        loadChildren: () => import('./programs/program.routes').then((m) => m.programRoutes),
      },
      {
        path: 'checks',
        title: 'Check report',
        loadChildren: () => import('./report/report.routes').then((m) => m.reportRoutes),
      },
      {
        path: 'racks',
        title: 'Rack',
        loadChildren: () => import('./racks/racks.routes').then((m) => m.rackRoutes),
      },
      {
        path: 'tools',
        title: 'Tools',
        loadChildren: () => import('./tools/tools.routes').then((m) => m.toolRoutes),
      },
      {
        path: 'machines',
        title: 'Machine',
        loadChildren: () => import('./machines/machines.routes').then((m) => m.machineRoutes),
      },
      {
        path: 'change-macro',
        title: 'Change macro',
        loadChildren: () =>
          import('./change-macro/change-macro.routes').then((m) => m.changeMacroRoutes),
      },
      {
        path: 'shop',
        title: 'Shop',
        loadChildren: () => import('./shop/shop.routes').then((m) => m.shopRoutes),
      },
      {
        path: '**',
        title: 'No such page',
        loadComponent: () => import('./shell/no-such-page').then((m) => m.NoSuchPage),
      },
    ],
  },
];
