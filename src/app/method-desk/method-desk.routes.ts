import type { Routes } from '@angular/router';

const loadReadingPage = () => import('./reading-page').then((module) => module.ReadingPage);

/** The Method desk; who may enter is decided where the rooms are listed. */
export const routes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    loadComponent: () => import('./method-desk-page').then((module) => module.MethodDeskPage),
  },
  { path: 'drafts/:draftId', title: 'Draft', loadComponent: loadReadingPage },
  { path: ':procedureId/:version', title: 'Version', loadComponent: loadReadingPage },
];
