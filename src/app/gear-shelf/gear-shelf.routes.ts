import type { Routes } from '@angular/router';

/** The Gear shelf: for everyone who is signed in. */
export const routes: Routes = [
  { path: '', loadComponent: () => import('./gear-shelf-page').then((module) => module.GearShelfPage) },
];
