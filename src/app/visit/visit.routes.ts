import type { Routes } from '@angular/router';
import { VisitPage } from './visit-page';

/** One car, one repair order, one concern. */
export const routes: Routes = [
  { path: 'new', title: 'New visit', loadComponent: () => import('./visit-form-page').then((m) => m.VisitFormPage) },
  {
    path: ':id/edit',
    title: 'Change a visit',
    loadComponent: () => import('./visit-form-page').then((m) => m.VisitFormPage),
  },
  { path: ':id', title: 'Visit', component: VisitPage },
];
