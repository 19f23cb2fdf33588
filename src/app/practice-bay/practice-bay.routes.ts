import type { Routes } from '@angular/router';

/** The Practice bay; who may enter is decided where the rooms are listed. */
export const routes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    loadComponent: () => import('./practice-bay-page').then((module) => module.PracticeBayPage),
  },
  {
    path: ':runId',
    title: 'Debrief',
    loadComponent: () => import('./debrief-page').then((module) => module.DebriefPage),
  },
];
