import type { Routes } from '@angular/router';

/** The Record room; who may enter is decided where the rooms are listed. */
export const routes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    loadComponent: () => import('./record-list-page').then((module) => module.RecordListPage),
  },
  {
    path: ':runId',
    title: 'Record',
    loadComponent: () => import('./record-page').then((module) => module.RecordPage),
  },
];
