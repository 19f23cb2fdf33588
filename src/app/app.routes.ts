import type { Routes } from '@angular/router';
import { BenchPage } from './bench/bench-page';
import { roleGuard, signedInGuard } from './core/signed-in-guard';
import { SignInPage } from './sign-in/sign-in-page';

/** One lazy route per feature. Who may not enter a room is told so before its code is loaded. */
export const routes: Routes = [
  {
    path: 'sign-in',
    title: 'Sign in',
    component: SignInPage,
  },
  {
    path: '',
    canActivate: [signedInGuard],
    children: [
      {
        path: '',
        pathMatch: 'full',
        title: 'Bench',
        component: BenchPage,
      },
      {
        path: 'tablet',
        title: 'This tablet',
        loadComponent: () => import('./tablet/tablet-page').then((m) => m.TabletPage),
      },
      {
        path: 'visit',
        canMatch: [roleGuard('technician', 'lead')],
        loadChildren: () => import('./at-the-car').then((m) => m.visitRoutes),
      },
      {
        path: 'run',
        title: 'Run',
        canMatch: [roleGuard('apprentice', 'technician', 'lead')],
        loadChildren: () => import('./at-the-car').then((m) => m.runRoutes),
      },
      {
        path: 'records',
        title: 'Record room',
        canMatch: [roleGuard('manager', 'lead')],
        loadChildren: () => import('./record-room/record-room.routes').then((m) => m.routes),
      },
      {
        path: 'method',
        title: 'Method desk',
        canMatch: [roleGuard('lead')],
        loadChildren: () => import('./method-desk/method-desk.routes').then((m) => m.routes),
      },
      {
        path: 'practice',
        title: 'Practice bay',
        canMatch: [roleGuard('apprentice', 'technician', 'lead')],
        loadChildren: () => import('./practice-bay/practice-bay.routes').then((m) => m.routes),
      },
      {
        path: 'gear',
        title: 'Gear shelf',
        loadChildren: () => import('./gear-shelf/gear-shelf.routes').then((m) => m.routes),
      },
      {
        path: 'not-yours',
        title: 'Not yours',
        loadComponent: () => import('./shared/not-yours-page').then((m) => m.NotYoursPage),
      },
      {
        path: '**',
        title: 'Not found',
        loadComponent: () => import('./shared/not-found-page').then((m) => m.NotFoundPage),
      },
    ],
  },
];
